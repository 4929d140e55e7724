import { describe, expect, it } from 'vitest';
import { compileExpressions, type ExpressionSet } from '@/lib/numerics/expression/compile-expressions';

function compile(set: Partial<ExpressionSet>) {
  return compileExpressions({ constants: {}, fields: { u: 'x' }, variables: ['x', 'y', 't'], ...set });
}
function messagesOf(set: Partial<ExpressionSet>): string[] {
  const result = compile(set);
  return result.ok ? [] : result.errors.map(({ message }) => message);
}
const many = (count: number, source: (index: number) => string) => Object.fromEntries(Array.from({ length: count }, (_, index) => [`c${index}`, source(index)]));
const sines = (index: number) => Array.from({ length: 240 }, (_, term) => `sin(x+${index}.${term})`).join('+');

describe('compileExpressions(set) refuses in well under a second', () => {
  it.each<[string, Partial<ExpressionSet>, string]>([
    ['a hundred thousand nodes', { constants: many(25, sines), fields: { u: 'x' } }, 'too large to evaluate'],
    ['more text than anybody writes', { constants: many(50, sines) }, '100000 characters together'],
    ['more names than anybody gives', { constants: many(20_000, () => 'q') }, '20001 constants and fields; at most 300'],
    ['names that lead to each other without end', { constants: many(200, (index) => (index === 199 ? 'x' : `c${index + 1}+1`)) }, '100 names lead'],
    ['powers of powers through names', { constants: many(40, (index) => `${'x^'.repeat(200)}${index === 39 ? 'x' : `c${index + 1}`}`) }, '2500 operations inside'],
    ['signs and powers in turn', { fields: { u: `${'x^-'.repeat(1300)}x` } }, '2500 operations inside'],
    ['derivatives of derivatives', { fields: { u: 'sin(x*y)^x' }, compared: { a: `${'d('.repeat(30)}u${',x)'.repeat(30)}` } }, 'too large'],
    ['one large derivative many times', { constants: many(8, sines), fields: { u: productOf(8) }, compared: { a: Array(570).fill('d(u,x)').join('+') } }, 'too large'],
  ])('%s', (_name, set, words) => {
    const begun = performance.now();
    const messages = messagesOf(set);
    expect(messages.some((message) => message.includes(words)), messages[0]).toBe(true);
    expect(performance.now() - begun).toBeLessThan(1500);
  });

  it('and tells at most twenty errors, each listing a few names', () => {
    const messages = messagesOf({ constants: many(250, () => 'q') });
    expect(messages).toHaveLength(20);
    expect(Math.max(...messages.map((message) => message.length))).toBeLessThan(400);
  });
});

function productOf(count: number): string {
  return Array.from({ length: count }, (_, index) => `c${index}`).join('*');
}

describe('compileExpressions(set) reads', () => {
  it('a long chain of names and a deep power', () => {
    expect(compile({ constants: many(90, (index) => (index === 89 ? 'x' : `2*c${index + 1}`)) }).ok).toBe(true);
    expect(compile({ fields: { u: `${'x^'.repeat(1999)}x` } }).ok).toBe(true);
    expect(compile({ fields: { u: `${'-('.repeat(100)}x${')'.repeat(100)}` } }).ok).toBe(true);
  });
});
