import { ExpressionProblem } from './expression-problem';

export type Token =
  | { readonly kind: 'number'; readonly text: string; readonly position: number; readonly value: number }
  | { readonly kind: 'name'; readonly text: string; readonly position: number }
  | { readonly kind: 'sign'; readonly text: Sign; readonly position: number };
type Sign = '+' | '-' | '*' | '/' | '^' | '(' | ')' | ',';

const longest = 4000;
const number = /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?/y;
const name = /[A-Za-z_][A-Za-z0-9_]*/y;
const signs = '+-*/^(),';

/**
 * Cuts an expression into numbers, names and signs. Throws an ExpressionProblem at the first character that the grammar
 * does not have, and at a number that a double cannot hold.
 */
export function tokenize(text: string): Token[] {
  if (text.length > longest) {
    throw new ExpressionProblem(longest, `The expression has ${text.length} characters; at most ${longest} are read. Move parts of it into constants.`);
  }
  const tokens: Token[] = [];
  let at = 0;
  while (at < text.length) {
    const character = text.charAt(at);
    if (/\s/.test(character)) {
      at += 1;
      continue;
    }
    const token = readNumber(text, at) ?? readName(text, at) ?? readSign(text, at);
    tokens.push(token);
    at += token.text.length;
  }
  return tokens;
}

function match(pattern: RegExp, text: string, at: number): string | null {
  pattern.lastIndex = at;
  return pattern.exec(text)?.[0] ?? null;
}

function readNumber(text: string, at: number): Token | null {
  const found = match(number, text, at);
  if (found === null) return null;
  const position = at + 1;
  const prefixed = /^0[xXbBoO][0-9A-Fa-f]+/.exec(text.slice(at))?.[0];
  if (prefixed !== undefined) {
    throw new ExpressionProblem(position, `Found “${prefixed}”; numbers are decimal. Write it out, such as 16 for 0x10.`);
  }
  const fortran = /^(?:\d+\.?\d*|\.\d+)[dD][+-]?\d+/.exec(text.slice(at))?.[0];
  if (fortran !== undefined) {
    throw new ExpressionProblem(position, `Found “${fortran}”; the exponent is marked with e. Write ${fortran.replace(/[dD]/, 'e')}.`);
  }
  const value = Number(found);
  if (!Number.isFinite(value)) throw new ExpressionProblem(position, `${found} is too large; the largest number is about 1.8e308.`);
  if (value === 0 && /[1-9]/.test(found.replace(/[eE].*/, ''))) {
    throw new ExpressionProblem(position, `${found} is too small; the smallest number is about 5e-324.`);
  }
  return { kind: 'number', text: found, position, value };
}

function readName(text: string, at: number): Token | null {
  const found = match(name, text, at);
  return found === null ? null : { kind: 'name', text: found, position: at + 1 };
}

function readSign(text: string, at: number): Token {
  const found = text.charAt(at);
  const position = at + 1;
  if (text.startsWith('**', at)) throw new ExpressionProblem(position, 'Found “**”; a power is written with ^, such as x^2.');
  if (signs.includes(found)) return { kind: 'sign', text: found as Sign, position };
  throw new ExpressionProblem(position, `Found “${String.fromCodePoint(text.codePointAt(at) ?? 0)}”; ${mendCharacter(found)}`);
}

function mendCharacter(found: string): string {
  switch (found) {
    case '!': return 'there is no factorial. Write the number or a product.';
    case '·': case '×': return 'multiplication is written with *.';
    case '÷': return 'division is written with /.';
    case '−': case '–': return 'write the minus of the keyboard, -.';
    case '²': return 'a power is written with ^, such as x^2.';
    case '³': return 'a power is written with ^, such as x^3.';
    case 'π': return 'write pi.';
    case '√': return 'write sqrt(…).';
    case '=': return 'an expression has no equals sign. Give the right-hand side only.';
    case '[': case ']': case '{': case '}': return 'use parentheses ( ).';
    case '<': case '>': case '?': case '|': case '%': return 'comparisons, choices, absolute values and remainders are not smooth and not part of the grammar.';
    default: return 'expected a number, a name, + - * / ^ or a parenthesis.';
  }
}
