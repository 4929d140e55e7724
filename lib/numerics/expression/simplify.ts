import type { BinaryOperation, Graph, Node, UnaryOperation } from './node';

/** A simpler node of the same value, or null where the operation stays as it is. */
export function simplifyUnary(graph: Graph, operation: UnaryOperation, a: Node): Node | null {
  if (operation !== 'negate') return null;
  if (a.kind === 'unary' && a.operation === 'negate') return a.a;
  if (a.kind === 'binary' && a.operation === 'subtract') return graph.binary('subtract', a.b, a.a);
  if (a.kind === 'binary' && a.operation === 'multiply' && a.a.kind === 'number') {
    return graph.binary('multiply', graph.number(-a.a.value), a.b);
  }
  return null;
}

export function simplifyBinary(graph: Graph, operation: BinaryOperation, a: Node, b: Node): Node | null {
  switch (operation) {
    case 'add': return simplifySum(graph, a, b);
    case 'subtract': return simplifyDifference(graph, a, b);
    case 'multiply': return simplifyProduct(graph, a, b);
    case 'divide': return simplifyQuotient(graph, a, b);
    case 'power': return simplifyPower(graph, a, b);
  }
}

function simplifySum(graph: Graph, a: Node, b: Node): Node | null {
  if (isNumber(a, 0)) return b;
  if (isNumber(b, 0)) return a;
  if (isNegation(b)) return graph.binary('subtract', a, b.a);
  if (isNegation(a)) return graph.binary('subtract', b, a.a);
  return null;
}

function simplifyDifference(graph: Graph, a: Node, b: Node): Node | null {
  if (a === b) return graph.number(0);
  if (isNumber(b, 0)) return a;
  if (isNumber(a, 0)) return graph.unary('negate', b);
  if (isNegation(b)) return graph.binary('add', a, b.a);
  return null;
}

function simplifyProduct(graph: Graph, a: Node, b: Node): Node | null {
  if (isNumber(a, 0) || isNumber(b, 0)) return graph.number(0);
  if (isNumber(a, 1)) return b;
  if (isNumber(b, 1)) return a;
  if (isNumber(a, -1)) return graph.unary('negate', b);
  if (isNumber(b, -1)) return graph.unary('negate', a);
  if (isNegation(a)) return graph.unary('negate', graph.binary('multiply', a.a, b));
  if (isNegation(b)) return graph.unary('negate', graph.binary('multiply', a, b.a));
  return mergeFactors(graph, a, b) ?? mergeFactors(graph, b, a);
}

/** 2·(3·u) is 6·u, and u·(3·v) is 3·(u·v): numbers gather in front. */
function mergeFactors(graph: Graph, a: Node, b: Node): Node | null {
  if (b.kind !== 'binary' || b.operation !== 'multiply' || b.a.kind !== 'number') return null;
  if (a.kind !== 'number') return graph.binary('multiply', b.a, graph.binary('multiply', a, b.b));
  const factor = a.value * b.a.value;
  return Number.isFinite(factor) && factor !== 0 ? graph.binary('multiply', graph.number(factor), b.b) : null;
}

function simplifyQuotient(graph: Graph, a: Node, b: Node): Node | null {
  if (isNumber(b, 1)) return a;
  if (isNumber(b, -1)) return graph.unary('negate', a);
  if (isNumber(a, 0) && !isNumber(b, 0)) return a;
  if (isNegation(a)) return graph.unary('negate', graph.binary('divide', a.a, b));
  return null;
}

function simplifyPower(graph: Graph, a: Node, b: Node): Node | null {
  if (isNumber(b, 0) || isNumber(a, 1)) return graph.number(1);
  return isNumber(b, 1) ? a : null;
}

function isNumber(node: Node, value: number): boolean {
  return node.kind === 'number' && node.value === value;
}

function isNegation(node: Node): node is Extract<Node, { kind: 'unary' }> {
  return node.kind === 'unary' && node.operation === 'negate';
}
