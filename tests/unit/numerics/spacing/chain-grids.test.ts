import { expect, it } from 'vitest';
import { chainGrids } from '@/lib/numerics/spacing/chain-grids';
import { spansRatio } from '@/lib/numerics/spacing/spans-ratio';

it('chainGrids(h) takes every grid at ratios of 1.3 or more', () => {
  expect(chainGrids([1, 1.3, 1.3 * 1.3, 4])).toEqual([0, 1, 2, 3]);
});

it('chainGrids(h) pairs across at a ratio of 1.1: each third grid', () => {
  expect(chainGrids(Array.from({ length: 8 }, (_, i) => 1.1 ** i))).toEqual([0, 3, 6]);
});

it('chainGrids(h) is only the finest where no grid is far enough', () => {
  expect(chainGrids([1, 1.1, 1.2])).toEqual([0]);
  expect(chainGrids([])).toEqual([]);
});

it('spansRatio(h) holds from 2 on, rounding allowed for', () => {
  expect(spansRatio([18_000 ** -0.5, 4_500 ** -0.5])).toBe(true);
  expect(spansRatio([1, 1.99])).toBe(false);
  expect(spansRatio([])).toBe(false);
});
