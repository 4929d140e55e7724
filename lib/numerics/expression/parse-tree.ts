import { create, parseDependencies, type MathNode } from 'mathjs';
import { ExpressionProblem } from './expression-problem';
import { checkOrder } from './check-order';
import { tokenize, type Token } from './tokenize';

const { parse } = create(parseDependencies ?? {});
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
  return readNode(parse(standIns.join(' ')), tokens);
}

/** The first character of a tree, counted from 1. */
export function positionOf(tree: Tree): number {
  switch (tree.kind) {
    case 'leaf': case 'call': return tree.token.position;
    case 'negate': return positionOf(tree.part);
    case 'operation': return positionOf(tree.left);
  }
}

interface SymbolLike extends MathNode { name: string }
interface CallLike extends MathNode { fn: SymbolLike; args: MathNode[] }
interface OperatorLike extends MathNode { op: string; fn: string; implicit: boolean; args: MathNode[] }

function readNode(node: MathNode, tokens: readonly Token[]): Tree {
  switch (node.type) {
    case 'ParenthesisNode':
      return readNode((node as MathNode & { content: MathNode }).content, tokens);
    case 'SymbolNode':
      return { kind: 'leaf', token: leafOf(node as SymbolLike, tokens) };
    case 'FunctionNode': {
      const call = node as CallLike;
      return { kind: 'call', token: leafOf(call.fn, tokens), parts: call.args.map((part) => readNode(part, tokens)) };
    }
    case 'OperatorNode':
      return readOperator(node as OperatorLike, tokens);
    default:
      throw new ExpressionProblem(1, 'The expression is not plain algebra; expected numbers, names, + - * / ^ and functions.');
  }
}

function leafOf(node: SymbolLike, tokens: readonly Token[]): Leaf {
  const token = tokens[Number(node.name.slice(1))];
  if (token === undefined || token.kind === 'sign') throw new Error(`parseTree: no token stands behind ${node.name}`);
  return token;
}

function readOperator(node: OperatorLike, tokens: readonly Token[]): Tree {
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
