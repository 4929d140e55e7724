import type { FunctionName } from './functions';
import type { Graph, Node, Variable } from './node';
import { listNodes } from './list-nodes';

/**
 * The derivative of a node by one variable, built on the same graph, so that what it shares with other nodes stays shared.
 * By the sum, product, quotient and chain rules, from the leaves up: no recursion, whatever the depth.
 */
export function differentiate(graph: Graph, node: Node, by: Variable): Node {
  const derivatives = new Map<Node, Node>();
  const zero = graph.number(0);
  const of = (part: Node) => derivatives.get(part) ?? zero;
  for (const part of listNodes([node])) derivatives.set(part, derive(graph, part, by, of));
  return of(node);
}

function derive(graph: Graph, node: Node, by: Variable, of: (part: Node) => Node): Node {
  if (node.kind === 'number') return graph.number(0);
  if (node.kind === 'variable') return graph.number(node.name === by ? 1 : 0);
  if (node.kind === 'unary') {
    if (node.operation === 'negate') return graph.unary('negate', of(node.a));
    return graph.binary('multiply', slope(graph, node.operation, node.a, node), of(node.a));
  }
  const { a, b } = node;
  switch (node.operation) {
    case 'add':
    case 'subtract':
      return graph.binary(node.operation, of(a), of(b));
    case 'multiply':
      return graph.binary('add', graph.binary('multiply', of(a), b), graph.binary('multiply', a, of(b)));
    case 'divide':
      // a/b by x is (a′ − (a/b)·b′)/b, which uses the quotient again.
      return graph.binary('divide', graph.binary('subtract', of(a), graph.binary('multiply', node, of(b))), b);
    case 'power':
      return derivePower(graph, node, a, b, of);
  }
}

function derivePower(graph: Graph, power: Node, a: Node, b: Node, of: (part: Node) => Node): Node {
  // Each part is left out where its factor is zero: log(a) must not appear for a number as exponent.
  const byBase = isZero(of(a)) ? graph.number(0) : graph.binary('multiply',
    graph.binary('multiply', b, graph.binary('power', a, graph.binary('subtract', b, graph.number(1)))), of(a));
  const byExponent = isZero(of(b)) ? graph.number(0) : graph.binary('multiply',
    graph.binary('multiply', power, graph.unary('log', a)), of(b));
  return graph.binary('add', byBase, byExponent);
}

function isZero(node: Node): boolean {
  return node.kind === 'number' && node.value === 0;
}

/** f′(a), where `value` is f(a). */
function slope(graph: Graph, name: FunctionName, a: Node, value: Node): Node {
  const one = graph.number(1);
  const square = (node: Node) => graph.binary('power', node, graph.number(2));
  const over = (node: Node) => graph.binary('divide', one, node);
  switch (name) {
    case 'sin': return graph.unary('cos', a);
    case 'cos': return graph.unary('negate', graph.unary('sin', a));
    case 'tan': return graph.binary('add', one, square(value));
    case 'sinh': return graph.unary('cosh', a);
    case 'cosh': return graph.unary('sinh', a);
    case 'tanh': return graph.binary('subtract', one, square(value));
    case 'asin': return over(graph.unary('sqrt', graph.binary('subtract', one, square(a))));
    case 'acos': return graph.unary('negate', over(graph.unary('sqrt', graph.binary('subtract', one, square(a)))));
    case 'atan': return over(graph.binary('add', one, square(a)));
    case 'exp': return value;
    case 'log': return over(a);
    case 'sqrt': return graph.binary('divide', graph.number(0.5), value);
    case 'erf':
      return graph.binary('multiply', graph.number(2 / Math.sqrt(Math.PI)), graph.unary('exp', graph.unary('negate', square(a))));
  }
}
