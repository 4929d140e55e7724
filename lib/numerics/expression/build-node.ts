import { differentiate } from './differentiate';
import { ExpressionProblem } from './expression-problem';
import { functionNames, isFunctionName, notSmooth, otherSpelling } from './functions';
import type { BinaryOperation, Graph, Node, Variable } from './node';
import { listNodes } from './list-nodes';
import { positionOf, type Tree } from './parse-tree';

/** A column of numbers is held for nearly every node while a file is read. */
const largestGraph = 10_000;
const operations = { '+': 'add', '-': 'subtract', '*': 'multiply', '/': 'divide', '^': 'power' } as const satisfies Record<string, BinaryOperation>;

/** What names stand for where an expression is read. */
export interface Scope {
  variables: readonly Variable[];
  isField(name: string): boolean;
  /** The node of a name, null where nothing has it. */
  find(name: string, position: number): Node | null;
  /** Names to offer when one is not known. */
  names(): string[];
  /** Counts one level more of parts inside parts, through names as well; refuses what no stack of calls would hold. */
  enter(position: number): void;
  leave(): void;
  /** Counts the nodes that a derivative goes through; refuses what would take too long. */
  spend(nodes: number, position: number): void;
}

/** Builds an expression on the graph. Throws an ExpressionProblem naming the character of what has no meaning. */
export function buildNode(graph: Graph, tree: Tree, scope: Scope): Node {
  scope.enter(tree.kind === 'leaf' ? tree.token.position : 1);
  const node = build(graph, tree, scope);
  scope.leave();
  return node;
}

function build(graph: Graph, tree: Tree, scope: Scope): Node {
  switch (tree.kind) {
    case 'leaf':
      return tree.token.kind === 'number' ? graph.number(tree.token.value) : findName(tree.token.text, tree.token.position, scope);
    case 'negate':
      return graph.unary('negate', buildNode(graph, tree.part, scope));
    case 'call':
      return buildCall(graph, tree, scope);
    case 'operation': {
      const left = buildNode(graph, tree.left, scope);
      const right = buildNode(graph, tree.right, scope);
      return checked(graph, graph.binary(operations[tree.operator], left, right), positionOf(tree));
    }
  }
}

function buildCall(graph: Graph, tree: Extract<Tree, { kind: 'call' }>, scope: Scope): Node {
  const { text: name, position } = tree.token;
  if (name === 'd') return buildDerivative(graph, tree, scope);
  if (!isFunctionName(name)) throw new ExpressionProblem(position, explainUnknownFunction(name, scope));
  const [part, extra] = tree.parts;
  if (part === undefined || extra !== undefined) {
    throw new ExpressionProblem(position, `${name} takes one value and was given ${tree.parts.length}.`);
  }
  return checked(graph, graph.unary(name, buildNode(graph, part, scope)), position);
}

function buildDerivative(graph: Graph, tree: Extract<Tree, { kind: 'call' }>, scope: Scope): Node {
  const [field, by, extra] = tree.parts;
  if (field === undefined || by === undefined || extra !== undefined) {
    throw new ExpressionProblem(tree.token.position, 'A derivative names a field and a coordinate, such as d(u, x).');
  }
  const variable = scope.variables.find((name) => by.kind === 'leaf' && by.token.text === name);
  if (variable === undefined) {
    throw new ExpressionProblem(positionOf(by), `A derivative is taken by one of ${scope.variables.join(', ')}.`);
  }
  const isDerivative = field.kind === 'call' && field.token.text === 'd';
  if (!isDerivative && !(field.kind === 'leaf' && scope.isField(field.token.text))) {
    throw new ExpressionProblem(positionOf(field), 'Only a field, or a derivative of one, is differentiated, such as d(u, x).');
  }
  const node = buildNode(graph, field, scope);
  scope.spend(listNodes([node]).length, tree.token.position);
  return checked(graph, differentiate(graph, node, variable), tree.token.position);
}

/** Refuses what has no finite value at any point, and what has grown beyond any use. */
function checked(graph: Graph, node: Node, position: number): Node {
  const isNumbersOnly = (node.kind === 'unary' && node.a.kind === 'number')
    || (node.kind === 'binary' && node.a.kind === 'number' && node.b.kind === 'number');
  const dividesByZero = node.kind === 'binary' && node.operation === 'divide' && node.b.kind === 'number' && node.b.value === 0;
  if (dividesByZero) throw new ExpressionProblem(position, 'This divides by zero.');
  if (isNumbersOnly) throw new ExpressionProblem(position, 'This has no finite real value.');
  if (graph.size() > largestGraph) throw new ExpressionProblem(position, 'The expressions and their derivatives are too large to evaluate.');
  return node;
}

function findName(name: string, position: number, scope: Scope): Node {
  const found = scope.find(name, position);
  if (found !== null) return found;
  if (isFunctionName(name)) throw new ExpressionProblem(position, `${name} is a function; write ${name}(…).`);
  if (['x', 'y', 'z', 't'].includes(name)) {
    throw new ExpressionProblem(position, `${name} is not a coordinate of this problem; it has ${scope.variables.join(', ')}.`);
  }
  throw new ExpressionProblem(position, `The name “${name}” is not known. Known here: ${scope.names().join(', ')}.`);
}

function explainUnknownFunction(name: string, scope: Scope): string {
  if (notSmooth.has(name)) return `${name} is not smooth, so the solution has no order to verify there. Use a smooth expression.`;
  const spelling = Object.hasOwn(otherSpelling, name) ? otherSpelling[name] : undefined;
  if (spelling !== undefined) return `The function “${name}” is not known; write ${spelling}.`;
  if (scope.find(name, 1) !== null) return `${name} is not a function; multiplication is written out: ${name}*( … ).`;
  return `The function “${name}” is not known. Known: ${functionNames.join(', ')}, d.`;
}
