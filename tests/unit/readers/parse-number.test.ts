import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseNumber, type NumberReading } from '@/lib/readers/parse-number';

function parse(text: string, allowComma = false) {
  const bytes = Buffer.from(`;${text};`, 'latin1');
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  const value = parseNumber(bytes, 1, bytes.length - 1, allowComma, reading);
  return { value, ...reading };
}

function expectAsLanguage(text: string) {
  const expected = Number(text);
  const { value, status } = parse(text);
  if (Number.isFinite(expected)) expect(Object.is(value, expected) && status === 'number' ? text : `${text} gave ${value}`).toBe(text);
  else expect([text, status]).toEqual([text, 'not-finite']);
}

describe('parseNumber(text)', () => {
  it.each([
    '0', '-0', '1', '+1', '.5', '5.', '-.5e1', '1e5', '1E+05', '1e-05', '1e22', '1e23', '1e-22', '1e-23', '1e308', '1e309', '5e-324',
    '2e-324', '9007199254740991', '9007199254740992', '9007199254740993', '9007199254740993e22', '0.1', '0.30000000000000004',
    // Halfway cases, and the two that hung or broke well-known parsers.
    '2.2250738585072011e-308', '2.2250738585072012e-308', '6.631236846766476e-316', '1.7976931348623158e308', '1.7976931348623159e308',
    '8.41e21', '9.5367431640625e-07', '7.2057594037927933e16', '0.500000000000000166533453693773481063544750213623046875',
    '100000000000000016777215', '100000000000000016777216', '179769313486231580793e289', `0.${'0'.repeat(400)}1e400`, `1${'0'.repeat(300)}`,
    '0000000000000000000000000001', '0.00000000000000000000000000000000', '123456789012345678901234567890e-20',
  ])('%s is what the language makes of it', expectAsLanguage);

  it('is what the language makes of 100 000 literals of every shape', () => {
    const digits = (most: number) => fc.string({ unit: fc.constantFrom(...'0123456789'), minLength: 1, maxLength: most });
    const literal = fc.tuple(fc.constantFrom('', '-', '+'), digits(22), fc.option(digits(22)), fc.option(fc.integer({ min: -330, max: 320 })))
      .map(([sign, whole, part, power]) => `${sign}${whole}${part === null ? '' : `.${part}`}${power === null ? '' : `e${power}`}`);
    const shortest = fc.double({ noNaN: true, noDefaultInfinity: true }).map(String);
    const seventeen = fc.double({ noNaN: true, noDefaultInfinity: true }).map((value) => value.toExponential(16));
    fc.assert(fc.property(fc.oneof(literal, shortest, seventeen), expectAsLanguage), { numRuns: 100_000 });
  }, 60_000);

  it.each([['1.5D3', 1500], ['1.5d-3', 0.0015], ['1.5Q+1', 15], ['1.5-101', 1.5e-101], ['-2.25+100', -2.25e100], ['.5D0', 0.5]])(
    '%s is %d, as Fortran writes it', (text, value) => expect(parse(text)).toMatchObject({ value, status: 'number' }),
  );

  it.each([['0,5', 0.5], ['-1,25e-3', -0.00125], ['1,5D2', 150], [',5', 0.5], ['0,083333333333333329', 0.083333333333333329]])(
    '%s is %d where a comma is the decimal mark', (text, value) => {
      expect(parse(text, true)).toMatchObject({ value, mark: 'comma', status: 'number' });
      expect(parse(text, false).status).toBe('not-a-number');
    },
  );

  it.each(['nan', 'NaN', '-nan', 'nan(ind)', 'inf', '-Infinity', '+INF', '1.#IND', '-1.#INF00', '1e400', '-1D400'])(
    '%s is not finite', (text) => expect(parse(text)).toMatchObject({ value: NaN, status: 'not-finite' }),
  );

  it.each(['', '-', '.', 'e5', '1e', '1e+', 'x', '1x', '1.2.3', '1 2', '0x10', '0b1', '1_000', '--1', '1,2,3', '1.234,5', '$5', '٣'])(
    '“%s” is not a number', (text) => expect(parse(text, true)).toMatchObject({ value: NaN, status: 'not-a-number' }),
  );

  it.each([['0', 0], ['0.000', 0], ['1', 1], ['0.0012', 2], ['1.500', 4], ['-12.5e3', 3], ['0.083333333333333329', 17]])(
    '%s has %i significant digits', (text, digits) => expect(parse(text).digits).toBe(digits),
  );
});
