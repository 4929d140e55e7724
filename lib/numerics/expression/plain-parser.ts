import { createParse } from 'mathjs';

declare module 'mathjs' {
  /** The parser alone, made from what it is given; its own types leave it out. */
  export function createParse(parts: Record<string, unknown>): (text: string) => PlainNode;
}

/** What the parser asks of anything it makes: its mark stands on the prototype. */
class Part {
  get isNode() {
    return true;
  }
}

class PlainSymbol extends Part {
  readonly kind = 'symbol';
  readonly isSymbolNode = true;
  constructor(readonly name: string) {
    super();
  }
}

class PlainParentheses extends Part {
  readonly kind = 'parentheses';
  constructor(readonly content: PlainNode) {
    super();
  }
}

class PlainCall extends Part {
  readonly kind = 'call';
  constructor(readonly fn: PlainNode, readonly args: readonly PlainNode[]) {
    super();
  }
}

class PlainOperation extends Part {
  readonly kind = 'operation';
  readonly isOperatorNode = true;
  constructor(readonly op: string, readonly fn: string, readonly args: readonly PlainNode[], readonly implicit = false) {
    super();
  }
}

export type PlainNode = PlainSymbol | PlainParentheses | PlainCall | PlainOperation;

/** Stands for all that the grammar does not have. */
class Refused {
  constructor() {
    throw new SyntaxError('not plain algebra');
  }
}

/** The parser fills a table of overloads: only that of a text is wanted. */
const typed = Object.assign((_name: string, overloads: Record<string, unknown>) => overloads.string, { addConversion: () => undefined });

const parse = createParse({
  typed, numeric: Number, config: {},
  SymbolNode: PlainSymbol, ParenthesisNode: PlainParentheses, FunctionNode: PlainCall, OperatorNode: PlainOperation,
  AccessorNode: Refused, ArrayNode: Refused, AssignmentNode: Refused, BlockNode: Refused, ConditionalNode: Refused, ConstantNode: Refused,
  FunctionAssignmentNode: Refused, IndexNode: Refused, ObjectNode: Refused, RangeNode: Refused, RelationalNode: Refused,
});

/**
 * Reads symbols, signs, parentheses and calls into their shape. The library's parser is made with shapes of our own: its
 * classes that can be evaluated, its types and units are neither reachable nor loaded, which takes a tenth of a second.
 * Throws SyntaxError where the text is not plain algebra.
 */
export function parsePlain(text: string): PlainNode {
  return parse(text);
}
