import { functions } from './functions';
import type { BinaryOperation, Graph, Node, UnaryOperation } from './node';
import { simplifyBinary, simplifyUnary } from './simplify';

/**
 * An expression graph in which equal parts are one node, and what can be computed at once is a number.
 * An operation on numbers without a finite result stays an operation, so that the caller can see it.
 */
export function createGraph(): Graph {
  const known = new Map<string, Node>();
  const intern = (key: string, make: (id: number) => Node): Node => {
    const found = known.get(key);
    if (found !== undefined) return found;
    const node = make(known.size);
    known.set(key, node);
    return node;
  };

  const graph: Graph = {
    // Adding zero turns −0 into 0, so that the two are not told apart.
    number: (value) => intern(`#${value + 0}`, (id) => ({ kind: 'number', id, value: value + 0 })),
    variable: (name) => intern(name, (id) => ({ kind: 'variable', id, name })),
    unary(operation, a) {
      const folded = a.kind === 'number' ? applyUnary(operation, a.value) : NaN;
      if (Number.isFinite(folded)) return graph.number(folded);
      return simplifyUnary(graph, operation, a)
        ?? intern(`${operation} ${a.id}`, (id) => ({ kind: 'unary', id, operation, a }));
    },
    binary(operation, a, b) {
      const folded = a.kind === 'number' && b.kind === 'number' ? applyBinary(operation, a.value, b.value) : NaN;
      if (Number.isFinite(folded)) return graph.number(folded);
      const simpler = simplifyBinary(graph, operation, a, b);
      if (simpler !== null) return simpler;
      const [left, right] = isCommutative(operation) && comesBefore(b, a) ? [b, a] : [a, b];
      return intern(`${operation} ${left.id} ${right.id}`, (id) => ({ kind: 'binary', id, operation, a: left, b: right }));
    },
    size: () => known.size,
  };
  return graph;
}

function applyUnary(operation: UnaryOperation, value: number): number {
  return operation === 'negate' ? -value : functions[operation](value);
}

function applyBinary(operation: BinaryOperation, a: number, b: number): number {
  switch (operation) {
    case 'add': return a + b;
    case 'subtract': return a - b;
    case 'multiply': return a * b;
    case 'divide': return a / b;
    case 'power': return a ** b;
  }
}

function isCommutative(operation: BinaryOperation): boolean {
  return operation === 'add' || operation === 'multiply';
}

function comesBefore(a: Node, b: Node): boolean {
  if (a.kind === 'number' || b.kind === 'number') return a.kind === 'number' && b.kind !== 'number';
  return a.id < b.id;
}
