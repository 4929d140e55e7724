import type { SizeRaster } from './mesh-part';

/** How cells shrink from a coarse grid to a fine one over their domain: quantiles of the local ratio of their sizes. */
export interface SizeRatios { low: number; median: number; high: number; places: number }

/** A mean over so many rows hardly moves with where a bin ends, or with cells that vary from one to the next. */
const fewestRows = [8, 64, 64] as const;

interface Bin { indices: number[]; coarse: Sum; fine: Sum }
interface Sum { rows: number; logs: number }
interface Leaf { ratio: number; volume: number }

/**
 * The 5 and 95 % quantiles and the median, by volume, of the local ratio of cell sizes (V^(1/D)) of two grids over one
 * domain, which is cut in two again and again as long as each part holds enough rows of both grids for a mean of log2 V.
 * `axes` are the directions that are refined, from 0; along others the mesh is one cell thick.
 * Null where no two parts come of it: too few rows to tell.
 */
export function sizeRatios(coarse: SizeRaster, fine: SizeRaster, axes: readonly number[]): SizeRatios | null {
  const exponents = coarse.exponents.map((exponent, axis) => Math.max(exponent, fine.exponents[axis] ?? exponent));
  const bins = mergeBins(coarse, fine, exponents);
  const leaves = splitBins(bins, axes, fewestRows[axes.length - 1] ?? 64).map((part) => leafOf(part, axes.length));
  if (leaves.length < 2) return null;
  leaves.sort((left, right) => left.ratio - right.ratio);
  return { low: quantile(leaves, 0.05), median: quantile(leaves, 0.5), high: quantile(leaves, 0.95), places: leaves.length };
}

/** Bins of both grids at one size, counted from the first. */
function mergeBins(coarse: SizeRaster, fine: SizeRaster, exponents: readonly number[]): Bin[] {
  const bins = new Map<string, Bin>();
  for (const [name, raster] of [['coarse', coarse], ['fine', fine]] as const) {
    const steps = exponents.map((exponent, axis) => 2 ** (exponent - (raster.exponents[axis] ?? exponent)));
    raster.counts.forEach((rows, at) => {
      const indices = steps.map((step, axis) => Math.floor((raster.indices[axis]?.[at] ?? 0) / step));
      const key = indices.join(' ');
      const bin = bins.get(key) ?? { indices, coarse: { rows: 0, logs: 0 }, fine: { rows: 0, logs: 0 } };
      bin[name].rows += rows;
      bin[name].logs += rows * (raster.logs[at] ?? 0);
      bins.set(key, bin);
    });
  }
  return [...bins.values()];
}

/** Cuts a part of the domain in two, along the direction with most bins as near to its middle as leaves enough rows of both grids on either side, and the halves again. */
function splitBins(bins: readonly Bin[], axes: readonly number[], fewest: number): (readonly Bin[])[] {
  const isEnough = (part: readonly Bin[]) => {
    const { coarse, fine } = sumOf(part);
    return coarse.rows >= fewest && fine.rows >= fewest;
  };
  if (!isEnough(bins)) return [];
  const ranges = axes.map((axis) => {
    const indices = bins.map((bin) => bin.indices[axis] ?? 0);
    return { axis, first: Math.min(...indices), last: Math.max(...indices) };
  }).sort((left, right) => (right.last - right.first) - (left.last - left.first));
  for (const { axis, first, last } of ranges) {
    const middle = (first + last + 1) / 2;
    const cuts = Array.from({ length: last - first }, (_, at) => first + 1 + at).sort((left, right) => Math.abs(left - middle) - Math.abs(right - middle));
    for (const cut of cuts) {
      const [below, above] = [bins.filter((bin) => (bin.indices[axis] ?? 0) < cut), bins.filter((bin) => (bin.indices[axis] ?? 0) >= cut)];
      if (isEnough(below) && isEnough(above)) return [...splitBins(below, axes, fewest), ...splitBins(above, axes, fewest)];
    }
  }
  return [bins];
}

function sumOf(bins: readonly Bin[]): { coarse: Sum; fine: Sum } {
  const total = { coarse: { rows: 0, logs: 0 }, fine: { rows: 0, logs: 0 } };
  for (const { coarse, fine } of bins) {
    total.coarse = { rows: total.coarse.rows + coarse.rows, logs: total.coarse.logs + coarse.logs };
    total.fine = { rows: total.fine.rows + fine.rows, logs: total.fine.logs + fine.logs };
  }
  return total;
}

/** Its volume is about that of its fine cells. */
function leafOf(bins: readonly Bin[], refined: number): Leaf {
  const { coarse, fine } = sumOf(bins);
  const [coarseLog, fineLog] = [coarse.logs / coarse.rows, fine.logs / fine.rows];
  return { ratio: 2 ** ((coarseLog - fineLog) / refined), volume: fine.rows * 2 ** fineLog };
}

/** The least ratio that with all smaller ones fills this part of the volume. */
function quantile(sorted: readonly Leaf[], part: number): number {
  const all = sorted.reduce((sum, { volume }) => sum + volume, 0);
  let sum = 0;
  for (const { ratio, volume } of sorted) {
    sum += volume;
    if (sum >= part * all) return ratio;
  }
  return sorted.at(-1)?.ratio ?? NaN;
}
