import { checkOrder } from './check-order';
import { parsePlain, type PlainNode } from './plain-parser';
import { tokenize, type Token } from './tokenize';

type Leaf = Exclude<Token, { kind: 'sign' }>;

/** The shape of an expression as written, every leaf with its place in the text. */
export type Tree =
  | { kind: 'leaf'; token: Leaf }
  | { kind: 'call'; token: Leaf; parts: Tree[] }
  | { kind: 'negate'; part: Tree }
  | { kind: 'operation'; operator: '+' | '-' | '*' | '/' | '^'; left: Tree; right: Tree };

/**
 * Reads an expression into a tree. Throws an ExpressionProblem where the text is not in the grammar.
 *
 * The parser is handed the signs and, for every number and name, a stand-in of our own: none of its units, keywords,
 * constants or number formats can be reached, and a stand-in leads back to its place in the text.
 */
export function parseTree(text: string): Tree {
  const tokens = tokenize(text);
  checkOrder(tokens, text.length);
  const standIns = tokens.map((token, index) => (token.kind === 'sign' ? token.text : `v${index}`));
  return readNode(parsePlain(standIns.join(' ')), tokens);
}

/** The first character of a tree, counted from 1. */
export function positionOf(tree: Tree): number {
  switch (tree.kind) {
    case 'leaf': case 'call': return tree.token.position;
    case 'negate': return positionOf(tree.part);
    case 'operation': return positionOf(tree.left);
  }
}

function readNode(node: PlainNode, tokens: readonly Token[]): Tree {
  switch (node.kind) {
    case 'parentheses': return readNode(node.content, tokens);
    case 'symbol': return { kind: 'leaf', token: leafOf(node, tokens) };
    case 'call': return { kind: 'call', token: leafOf(node.fn, tokens), parts: node.args.map((part) => readNode(part, tokens)) };
    case 'operation': return readOperator(node, tokens);
  }
}

function leafOf(node: PlainNode, tokens: readonly Token[]): Leaf {
  const token = node.kind === 'symbol' ? tokens[Number(node.name.slice(1))] : undefined;
  if (token === undefined || token.kind === 'sign') throw new Error(`parseTree: no token stands behind ${node.kind === 'symbol' ? node.name : node.kind}`);
  return token;
}

function readOperator(node: Extract<PlainNode, { kind: 'operation' }>, tokens: readonly Token[]): Tree {
  const [left, right] = node.args;
  if (left !== undefined && right === undefined) {
    const part = readNode(left, tokens);
    return node.fn === 'unaryMinus' ? { kind: 'negate', part } : part;
  }
  const operator = node.op;
  const isOurs = operator === '+' || operator === '-' || operator === '*' || operator === '/' || operator === '^';
  if (left === undefined || right === undefined || !isOurs || node.implicit) {
    throw new Error(`parseTree: the operator ${node.op} came through the check of the order`);
  }
  return { kind: 'operation', operator, left: readNode(left, tokens), right: readNode(right, tokens) };
}
