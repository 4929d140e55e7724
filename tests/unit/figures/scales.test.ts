import { describe, expect, it } from 'vitest';
import { decadeTicks } from '@/lib/figures/decade-ticks';
import { linearMap } from '@/lib/figures/linear-map';
import { roundTicks } from '@/lib/figures/round-ticks';
import { spacingLabel } from '@/lib/figures/spacing-label';
import { axisNumber } from '@/lib/figures/axis-number';

describe('decadeTicks(from, to)', () => {
  it('gives nine digits for each whole decade and closes on the last one', () => {
    const ticks = decadeTicks(-2, -1);
    expect(ticks.map(({ digit }) => digit)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 1]);
    expect(ticks[4]?.log).toBeCloseTo(Math.log10(0.05), 12);
  });

  it('gives only the digits inside a part of a decade', () => {
    expect(decadeTicks(Math.log10(0.0025), Math.log10(0.0055)).map(({ digit }) => digit)).toEqual([3, 4, 5]);
  });
});

describe('roundTicks(from, to, most)', () => {
  it('steps by 1, 2 or 5 times a power of ten and says how many decimals that needs', () => {
    expect(roundTicks(0.6341, 0.6462, 7)).toEqual({ values: [0.636, 0.638, 0.64, 0.642, 0.644, 0.646].map((value) => expect.closeTo(value, 12) as number), decimals: 3 });
  });

  it('never gives more ticks than asked for', () => {
    for (const span of [0.3, 1, 1.7, 4, 9.9, 70]) expect(roundTicks(-span, span, 6).values.length).toBeLessThanOrEqual(7);
  });

  it('refuses an empty range, naming it', () => {
    expect(() => roundTicks(2, 2, 5)).toThrow(/got 2 and 2/);
  });
});

describe('spacingLabel(h)', () => {
  it.each([[1 / 64, '1/64'], [1 / 3, '1/3'], [1, '1'], [0.0123, '0.012'], [2.5, '2.5']])('%d is %s', (h, label) => {
    expect(spacingLabel(h)).toBe(label);
  });

  it('refuses a spacing that is not above 0, naming it', () => {
    expect(() => spacingLabel(0)).toThrow(/got 0/);
  });
});

describe('axisNumber(value, decimals)', () => {
  const text = (value: number, decimals: number) => axisNumber(value, decimals).map((run) => run.text).join('');

  it('writes plain decimals with the minus of print and thousands apart', () => {
    expect(text(-0.5, 1)).toBe('−0.5');
    expect(text(12000, 0)).toBe('12\u202f000');
  });

  it('never writes a negative zero', () => {
    expect(text(-1e-17, 2)).toBe('0.00');
  });

  it('turns to a power of ten where decimals would be mostly zeros', () => {
    expect(text(2.5e-9, 10)).toBe('2.5\u00a0×\u00a010−9');
  });
});

describe('linearMap(from, to, start, end)', () => {
  it('takes both ends to both ends and the middle to the middle', () => {
    const map = linearMap(-2, 0, 58, 258);
    expect([map(-2), map(-1), map(0)]).toEqual([58, 158, 258]);
  });
});
