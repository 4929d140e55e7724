import { chainGrids } from '../spacing/chain-grids';
import { flatAxes } from './flat-axes';
import type { MeshSurvey } from './mesh-part';
import { sizeRatios, type SizeRatios } from './size-ratios';

/** A grid of the series as far as it tells how its cells lie. */
export interface SurveyedGrid {
  label: string;
  h: number;
  /** Null where nothing was read of it. */
  survey: MeshSurvey | null;
  /** Whether its weights are volumes of cells. */
  isSized: boolean;
  /** Cells along each direction, as stated; null where they are not. */
  counts: readonly number[] | null;
}

/** How cells shrink from the coarse grid to the fine one: quantiles of the local ratio, and the ratio along each direction, where known. */
export interface PairSimilarity {
  coarse: string; fine: string;
  low: number | null; median: number | null; high: number | null;
  directions?: number[];
  isAlike: boolean;
}

/** Similarity of the two finest pairs of a series. */
export interface Similarity { isSimilar: boolean; pairs: PairSimilarity[] }

/** Quantiles may depart from the median, and directions from their mean, by so much. */
const departure = 0.1;

/**
 * Whether the grids of a series, the finest first, are refined alike everywhere, from the two finest pairs at a ratio of 1.3
 * or more: not where the 5 or 95 % quantile of the local size ratio departs from its median by more than 10 % on both, or
 * where on either the ratio along a direction departs from the mean over directions by more than that. Directions one cell
 * thick on both grids count for nothing. Null where nothing is known of any pair.
 */
export function judgeSimilarity(grids: readonly SurveyedGrid[]): Similarity | null {
  const chain = chainGrids(grids.map(({ h }) => h)).flatMap((index) => grids[index] ?? []).slice(0, 3);
  const known = chain.slice(1).flatMap((coarse, index) => {
    const fine = chain[index];
    return fine === undefined ? [] : comparePair(coarse, fine);
  });
  if (known.length === 0) return null;
  const localBoth = known.length === 2 && known.every(({ pair }) => departs([pair.low, pair.high], pair.median));
  const isSimilar = !localBoth && known.every(({ byDirection }) => byDirection);
  return { isSimilar, pairs: known.map(({ pair }) => pair) };
}

function comparePair(coarse: SurveyedGrid, fine: SurveyedGrid): { pair: PairSimilarity; byDirection: boolean }[] {
  const local = localRatios(coarse, fine);
  const directions = directionRatios(coarse, fine);
  if (local === null && directions === null) return [];
  const mean = directions && Math.exp(directions.reduce((sum, ratio) => sum + Math.log(ratio), 0) / directions.length);
  const byDirection = directions === null || !departs(directions, mean);
  const { low = null, median = null, high = null } = local ?? {};
  return [{
    byDirection,
    pair: { coarse: coarse.label, fine: fine.label, low, median, high, ...(directions && { directions }), isAlike: byDirection && !departs([low, high], median) },
  }];
}

function localRatios(coarse: SurveyedGrid, fine: SurveyedGrid): SizeRatios | null {
  const [large, small] = [coarse, fine].map(({ survey, isSized }) => (isSized ? survey?.sizes : undefined));
  if (!large || !small || !fine.survey) return null;
  const flat = flatAxes(fine.survey);
  return sizeRatios(large, small, large.exponents.map((_, axis) => axis).filter((axis) => !flat.includes(axis)));
}

/** From counts where both grids state them, else from sizes; directions that are one cell thick on both are left out. */
function directionRatios(coarse: SurveyedGrid, fine: SurveyedGrid): number[] | null {
  const ratios = countRatios(coarse.counts ?? [], fine.counts ?? []) ?? extentRatios(coarse.survey, fine.survey);
  return ratios.length < 2 ? null : ratios;
}

function countRatios(coarse: readonly number[], fine: readonly number[]): number[] | null {
  if (coarse.length === 0 || coarse.length !== fine.length) return null;
  return coarse.flatMap((count, axis) => (count === 1 && fine[axis] === 1 ? [] : [(fine[axis] ?? count) / count]));
}

function extentRatios(coarse: MeshSurvey | null, fine: MeshSurvey | null): number[] {
  if (!coarse?.extents || !fine?.extents) return [];
  const flat = flatAxes(fine);
  return coarse.extents.flatMap((size, axis) => (flat.includes(axis) ? [] : [size / (fine.extents?.[axis] ?? size)]));
}

function departs(values: readonly (number | null)[], from: number | null): boolean {
  return from !== null && values.some((value) => value !== null && (value < (1 - departure) * from || value > (1 + departure) * from));
}
