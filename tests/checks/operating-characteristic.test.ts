import { describe, expect, it } from 'vitest';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { errorSeries } from '../support/series';

// How often the outcome rule errs, as stated with the rule: formal order 2, r = 2, coarsest h uniform in [0.05, 0.8].
// Second-order codes E = |h²(1 + ah + bh²)|, a and b normal with standard deviations 2 and 4, must not fail;
// first-order ones E = |ah + h²|, log10|a| uniform in [−3, 0], either sign, must not pass.
const draws = 20_000;
const stated = [
  { grids: 4, falseFails: 1.4, falsePasses: 0.8 },
  { grids: 5, falseFails: 0.2, falsePasses: 0 },
  { grids: 6, falseFails: 0, falsePasses: 0 },
];
const withinPoints = 0.4;

/** Uniform numbers in (0, 1): the multiply-with-carry pair of G. Marsaglia, fixed seeds, so that the test repeats itself. */
function uniformNumbers(seed: number): () => number {
  let [high, low] = [362_436_069 ^ seed, 521_288_629 + seed];
  return () => {
    high = 36_969 * (high & 65_535) + (high >>> 16);
    low = 18_000 * (low & 65_535) + (low >>> 16);
    return ((((high << 16) + (low & 65_535)) >>> 0) + 0.5) / 2 ** 32;
  };
}

function normalNumbers(uniform: () => number, deviation: number): () => number {
  return () => deviation * Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}

function percentOf(outcome: string, grids: number, error: () => (h: number) => number, uniform: () => number): number {
  let count = 0;
  for (let draw = 0; draw < draws; draw += 1) {
    const coarsest = 0.05 + 0.75 * uniform();
    const h = Array.from({ length: grids }, (_, i) => coarsest / 2 ** i);
    const errors = h.map(error());
    if (judgeErrorSeries(errorSeries(h, errors, { scale: 0 })).outcome === outcome) count += 1;
  }
  return (100 * count) / draws;
}

describe('operating characteristic of the outcome rule', () => {
  it.each(stated)('$grids grids: $falseFails % false fails', ({ grids, falseFails }) => {
    const uniform = uniformNumbers(grids);
    const [a, b] = [normalNumbers(uniform, 2), normalNumbers(uniform, 4)];
    const found = percentOf('fail', grids, () => {
      const [first, second] = [a(), b()];
      return (h) => Math.abs(h * h * (1 + first * h + second * h * h));
    }, uniform);
    expect(Math.abs(found - falseFails), `${found} % against ${falseFails} %`).toBeLessThanOrEqual(withinPoints);
  });

  it.each(stated)('$grids grids: $falsePasses % false passes', ({ grids, falsePasses }) => {
    const uniform = uniformNumbers(100 + grids);
    const found = percentOf('pass', grids, () => {
      const a = (uniform() < 0.5 ? -1 : 1) * 10 ** (-3 * uniform());
      return (h) => Math.abs(a * h + h * h);
    }, uniform);
    expect(Math.abs(found - falsePasses), `${found} % against ${falsePasses} %`).toBeLessThanOrEqual(withinPoints);
  });
});
