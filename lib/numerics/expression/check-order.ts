import { ExpressionProblem } from './expression-problem';
import { isFunctionName } from './functions';
import type { Token } from './tokenize';

const deepest = 100;

/**
 * Checks that numbers, names and signs follow each other as the grammar allows and that parentheses close, so that the
 * parser is only given what it reads in one way. Throws an ExpressionProblem at the first token out of place.
 */
export function checkOrder(tokens: readonly Token[], length: number): void {
  if (tokens.length === 0) throw new ExpressionProblem(1, 'The expression is empty; expected a number, a name or a formula.');
  const open: { call: boolean; position: number }[] = [];
  let before: Token | null = null;
  let signed = false;
  for (const token of tokens) {
    if (before !== null && endsOperand(before)) {
      checkAfterOperand(before, token, open);
      signed = false;
    } else {
      signed = checkOperand(before, token, signed);
    }
    if (is(token, '(')) {
      open.push({ call: before?.kind === 'name', position: token.position });
      if (open.length > deepest) throw new ExpressionProblem(token.position, `More than ${deepest} parentheses inside each other. Move parts into constants.`);
    }
    if (is(token, ')')) open.pop();
    before = token;
  }
  if (!endsOperand(before)) {
    throw new ExpressionProblem(length + 1, `The expression ends after “${before?.text ?? ''}”; expected a number, a name or “(”.`);
  }
  const unclosed = open.pop();
  if (unclosed) throw new ExpressionProblem(unclosed.position, 'This “(” is not closed; expected “)”.');
}

function is(token: Token | null, sign: string): boolean {
  return token?.kind === 'sign' && token.text === sign;
}

function endsOperand(token: Token | null): boolean {
  return token !== null && (token.kind !== 'sign' || token.text === ')');
}

function checkAfterOperand(before: Token, token: Token, open: { call: boolean }[]): void {
  if (is(token, '(')) {
    if (before.kind === 'name') return;
    throw new ExpressionProblem(token.position, `Found “(” after “${before.text}”; multiplication is written out: ${before.text}*( …`);
  }
  if (token.kind !== 'sign') {
    if (isFunctionName(before.text)) {
      throw new ExpressionProblem(token.position, `Found “${token.text}” after “${before.text}”; write ${before.text}(${token.text}).`);
    }
    throw new ExpressionProblem(token.position, `Found “${token.text}” after “${before.text}”; expected an operator. Multiplication is written out: ${before.text}*${token.text}.`);
  }
  if (token.text === ')' && open.length === 0) {
    throw new ExpressionProblem(token.position, 'Found “)” without a “(” before it.');
  }
  if (token.text === ',' && open.at(-1)?.call !== true) {
    throw new ExpressionProblem(token.position, 'Found “,”; the decimal mark is a point, and only d(field, x) has two parts.');
  }
}

/** Whether the token is the sign of an operand; `signed` says that one stands before it already. */
function checkOperand(before: Token | null, token: Token, signed: boolean): boolean {
  if (token.kind !== 'sign' || token.text === '(') return false;
  if (!signed && (is(token, '+') || is(token, '-'))) return true;
  const where = before === null ? 'at the beginning' : `after “${before.text}”`;
  throw new ExpressionProblem(token.position, `Found “${token.text}” ${where}; expected a number, a name or “(”.`);
}
