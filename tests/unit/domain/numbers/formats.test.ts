import { describe, expect, it } from 'vitest';
import { formatCount } from '@/lib/domain/numbers/format-count';
import { formatError } from '@/lib/domain/numbers/format-error';
import { formatMeasure } from '@/lib/domain/numbers/format-measure';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { formatPercent } from '@/lib/domain/numbers/format-percent';
import { formatRatio } from '@/lib/domain/numbers/format-ratio';
import { formatValue } from '@/lib/domain/numbers/format-value';
import { orderWord } from '@/lib/domain/numbers/order-word';

describe('formatError(value)', () => {
  it.each([[2.2e-4, '2.20\u00A0×\u00A010⁻⁴'], [0.0123, '1.23\u00A0×\u00A010⁻²'], [1, '1.00\u00A0×\u00A010⁰'], [-4.567e12, '\u22124.57\u00A0×\u00A010¹²'], [9.999e-7, '1.00\u00A0×\u00A010⁻⁶'], [0, '0']])('of %d', (value, text) => {
    expect(formatError(value).text).toBe(text);
  });
  it('gives mantissa and exponent for a page that sets them itself', () => expect(formatError(2.2e-4)).toMatchObject({ mantissa: '2.20', exponent: -4 }));
});

describe('formatOrder(order, limits)', () => {
  it('has two decimals, three within 0.01 of a limit', () => {
    expect(formatOrder(1.9876)).toBe('1.99');
    expect(formatOrder(1.895, [1.9, 2.2])).toBe('1.895');
    expect(formatOrder(1.8899, [1.9, 2.2])).toBe('1.89');
    expect(formatOrder(2.2, [1.9, 2.2])).toBe('2.200');
  });
  it('has the minus of print and no minus before zero', () => {
    expect(formatOrder(-0.15)).toBe('\u22120.15');
    expect(formatOrder(-0.001)).toBe('0.00');
  });
});

describe('formatPercent(fraction)', () => {
  it.each([[0.0015, '0.15'], [0.0217, '2.2'], [0.02, '2.0'], [0.1234, '12'], [1.234, '120'], [12.34, '1\u202F200'], [0, '0'], [-0.05, '\u22125.0'], [1.23e-9, '1.2\u00A0×\u00A010⁻⁷'], [3.4e22, '3.4\u00A0×\u00A010²⁴']])('of %d', (fraction, text) => {
    expect(formatPercent(fraction)).toBe(`${text}\u202F%`);
  });
});

it('formatCount(count) sets thousands apart', () => expect([999, 1000, 10_240, 1_234_567].map(formatCount)).toEqual(['999', '1\u202F000', '10\u202F240', '1\u202F234\u202F567']));
it('formatRatio(ratio) has two decimals', () => expect([4.08, 2, 1234.5, 1.5e22].map(formatRatio)).toEqual(['4.08', '2.00', '1\u202F234.50', '1.50\u00A0×\u00A010²²']));
it('orderWord(order) is how people say it', () => expect([1, 2, 10, 1.5, 2 / 3, 12].map(orderWord)).toEqual(['first order', 'second order', 'tenth order', 'order 1.5', 'order 0.667', 'order 12']));

describe('formatValue(value, uncertainty, digits)', () => {
  it('has the digits that the uncertainty leaves', () => {
    expect(formatValue(0.635662, 9.4e-4, 1)).toBe('0.6357');
    expect(formatValue(0.635662, 9.4e-4)).toBe('0.63566');
    expect(formatValue(1234.56, 20)).toBe('1\u202F235');
    expect([formatValue(2e-16, 0.22, 1), formatValue(-1e-6, 4.9e-4), formatValue(0.2, 60)]).toEqual(['0.0', '0.00000', '0']);
    expect(formatValue(-5.2e-6, 3e-8)).toBe('\u22125.200\u00A0×\u00A010⁻⁶');
  });
  it('has six significant digits without one', () => {
    expect(formatValue(344.675)).toBe('344.675');
    expect(formatValue(0.0017526460001)).toBe('0.00175265');
    expect(formatValue(12)).toBe('12');
    expect(formatValue(0)).toBe('0');
  });
});

it('formatMeasure(value, unit) has two digits and its unit', () => {
  expect([8.94, 0.0941, 9.44e-4, 123, 12_345].map((value) => formatMeasure(value))).toEqual(['8.9', '0.094', '9.4\u00A0×\u00A010⁻⁴', '120', '1.2\u00A0×\u00A010⁴']);
  expect(formatMeasure(8.94, 'MPa')).toBe('8.9 MPa');
});
