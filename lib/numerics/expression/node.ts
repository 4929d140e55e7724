import type { FunctionName } from './functions';

export type UnaryOperation = 'negate' | FunctionName;
export type BinaryOperation = 'add' | 'subtract' | 'multiply' | 'divide' | 'power';
export type Variable = 'x' | 'y' | 'z' | 't';

/** A node's operands were built before it, so ids rise from the leaves to the results. */
export type Node =
  | { readonly kind: 'number'; readonly id: number; readonly value: number }
  | { readonly kind: 'variable'; readonly id: number; readonly name: Variable }
  | { readonly kind: 'unary'; readonly id: number; readonly operation: UnaryOperation; readonly a: Node }
  | { readonly kind: 'binary'; readonly id: number; readonly operation: BinaryOperation; readonly a: Node; readonly b: Node };

export interface Graph {
  number(value: number): Node;
  variable(name: Variable): Node;
  unary(operation: UnaryOperation, a: Node): Node;
  binary(operation: BinaryOperation, a: Node, b: Node): Node;
  /** Nodes built so far. */
  size(): number;
}
