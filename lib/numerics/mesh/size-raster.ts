import type { MeshRows, RasterPart, SizeRaster } from './mesh-part';

/** Bins along each direction in one, two and three dimensions. */
const binsOf = [32, 16, 8] as const;
/** Bins are no smaller than this power of two below the coordinates, so that rounding of a constant one makes no bins of its own. */
const finest = 20;
/** What logarithms are counted in. */
const logUnits = 65_536;
/** The first bits of the mantissa tell them to 0.05 %. */
const mantissaBits = 11;
const mantissaLogs = Int32Array.from({ length: 2 ** mantissaBits }, (_, i) => Math.round(Math.log2(1 + (i + 0.5) / 2 ** mantissaBits) * logUnits));

export interface SizeRasterGatherer {
  /** Rows and weights, with the bounds of their coordinates. */
  add(block: Pick<MeshRows, 'rows' | 'coordinates'> & { weights: Float64Array; low: readonly number[]; high: readonly number[] }): void;
  addPart(part: RasterPart): void;
  /** What was added since the last part; the size of bins stays for what is to come. Null where nothing was. */
  takePart(): RasterPart | null;
  finish(): SizeRaster | null;
}

/** Bins lie at their index modulo the bins a direction, which is one bin each as long as they reach no further. */
interface Raster { bins: number; exponents: number[]; first: number[]; last: number[]; counts: Float64Array; logs: Float64Array }

/**
 * Gathers the mean of log2 V of the rows in each bin of a raster over the coordinates, V being their weight, to 0.05 %. Bins
 * are of a power of two along each direction and stand at multiples of it, so that they grow by merging as coordinates come,
 * and rasters of several grids over one domain fit each other. The same rows give the same bits in any order and any parts.
 */
export function createSizeRaster(dimension: number): SizeRasterGatherer {
  const bins = binsOf[dimension - 1] ?? 8;
  let raster: Raster | null = null;
  let isEmpty = true;

  const cover = (low: readonly number[], high: readonly number[]): Raster => {
    raster ??= startRaster(low, bins);
    raster = isEmpty ? reach({ ...raster, first: low.map(() => Infinity), last: low.map(() => -Infinity) }, low, high) : reach(raster, low, high);
    isEmpty = false;
    return raster;
  };
  const bounds = ({ exponents, indices }: RasterPart, of: (...values: number[]) => number) => (
    exponents.map((exponent, axis) => (of(...(indices[axis] ?? [])) + 0.5) * 2 ** exponent)
  );
  const takePart = (): RasterPart | null => {
    if (raster === null || isEmpty) return null;
    const part = filledBins(raster);
    raster.counts.fill(0);
    raster.logs.fill(0);
    isEmpty = true;
    return part;
  };
  return {
    add: (block) => addRows(cover(block.low, block.high), block),
    addPart(part) {
      // The middle of a bin lies in one bin of any larger size.
      const reached = cover(bounds(part, Math.min), bounds(part, Math.max));
      raster = coarsen(reached, part.exponents.map((exponent, axis) => Math.max(exponent, reached.exponents[axis] ?? exponent)));
      addBins(raster, part);
    },
    takePart,
    finish() {
      const all = takePart();
      return all && { ...all, logs: all.logs.map((sum, at) => Math.round((sum / logUnits / (all.counts[at] ?? 1)) * keptDigits) / keptDigits) };
    },
  };
}

/** A raster is kept with each grid: this tells sizes apart well enough. */
const keptDigits = 1e4;

function startRaster(low: readonly number[], bins: number): Raster {
  const exponents = low.map((value) => Math.max(-1000, (value === 0 ? -2 * finest : Math.floor(Math.log2(Math.abs(value)))) - finest));
  return { bins, exponents, first: [], last: [], counts: new Float64Array(bins ** low.length), logs: new Float64Array(bins ** low.length) };
}

/** With bins that reach from low to high: as they are, more of them, or larger ones. */
function reach(raster: Raster, low: readonly number[], high: readonly number[]): Raster {
  const isReached = raster.exponents.every((exponent, axis) => {
    const size = 2 ** exponent;
    return (low[axis] ?? 0) >= (raster.first[axis] ?? 0) * size && (high[axis] ?? 0) < ((raster.last[axis] ?? 0) + 1) * size;
  });
  if (isReached) return raster;
  const range = (axis: number, exponent: number) => {
    const [size, merged] = [2 ** exponent, 2 ** (exponent - (raster.exponents[axis] ?? exponent))];
    return {
      first: Math.min(Math.floor((low[axis] ?? 0) / size), Math.floor((raster.first[axis] ?? 0) / merged)),
      last: Math.max(Math.floor((high[axis] ?? 0) / size), Math.floor((raster.last[axis] ?? 0) / merged)),
    };
  };
  const exponents = raster.exponents.map((stated, axis) => {
    let exponent = stated;
    for (let { first, last } = range(axis, exponent); !(last - first < raster.bins) && exponent < 1023; { first, last } = range(axis, exponent)) exponent += 1;
    return exponent;
  });
  const ranges = exponents.map((exponent, axis) => range(axis, exponent));
  return { ...coarsen(raster, exponents), first: ranges.map(({ first }) => first), last: ranges.map(({ last }) => last) };
}

/** The same rows in bins of larger sizes. */
function coarsen(raster: Raster, exponents: number[]): Raster {
  const steps = exponents.map((exponent, axis) => 2 ** (exponent - (raster.exponents[axis] ?? exponent)));
  if (steps.every((step) => step === 1)) return raster;
  const merge = (index: number, axis: number) => Math.floor(index / (steps[axis] ?? 1));
  const coarse = { ...raster, exponents, first: raster.first.map(merge), last: raster.last.map(merge), counts: new Float64Array(raster.counts.length), logs: new Float64Array(raster.logs.length) };
  if (raster.first.every(Number.isFinite)) {
    const { indices, counts, logs } = filledBins(raster);
    addBins(coarse, { exponents, indices: indices.map((each, axis) => each.map((index) => merge(index, axis))), counts, logs });
  }
  return coarse;
}

/** Adds bins of a size no larger than those of the raster, which reaches over them. */
function addBins({ bins, exponents, counts, logs }: Raster, part: RasterPart): void {
  const steps = exponents.map((exponent, axis) => 2 ** (exponent - (part.exponents[axis] ?? exponent)));
  for (let at = 0; at < part.counts.length; at += 1) {
    let slot = 0;
    for (let axis = exponents.length - 1; axis >= 0; axis -= 1) slot = slot * bins + modulo(Math.floor((part.indices[axis]?.[at] ?? 0) / (steps[axis] ?? 1)), bins);
    counts[slot] = (counts[slot] as number) + (part.counts[at] as number);
    logs[slot] = (logs[slot] as number) + (part.logs[at] as number);
  }
}

/** The index of a bin along a direction follows from its place there, its index modulo the bins: none lies as many bins from the first. */
function filledBins({ bins, exponents, first, counts, logs }: Raster): RasterPart {
  const part: RasterPart = { exponents, indices: exponents.map(() => []), counts: [], logs: [] };
  for (let slot = 0; slot < counts.length; slot += 1) {
    const count = counts[slot] as number;
    if (count === 0) continue;
    let places = slot;
    for (let axis = 0; axis < exponents.length; axis += 1) {
      const from = first[axis] as number;
      part.indices[axis]?.push(from + modulo((places % bins) - from, bins));
      places = Math.floor(places / bins);
    }
    part.counts.push(count);
    part.logs.push(logs[slot] as number);
  }
  return part;
}

function modulo(index: number, bins: number): number {
  return ((index % bins) + bins) % bins;
}

function addRows({ bins, exponents, counts, logs }: Raster, { rows, coordinates, weights }: Pick<MeshRows, 'rows' | 'coordinates'> & { weights: Float64Array }): void {
  const [x, y, z] = coordinates as [Float64Array, Float64Array | undefined, Float64Array | undefined];
  const [perX = 1, perY = 1, perZ = 1] = exponents.map((exponent) => 2 ** -exponent);
  const [mask, square] = [bins - 1, bins * bins];
  const [table, shift, lowest] = [mantissaLogs, 20 - mantissaBits, 2 ** mantissaBits - 1];
  const words = new Int32Array(weights.buffer, weights.byteOffset, 2 * rows);
  // Rows one after another mostly lie in one bin.
  let current = 0;
  let count = 0;
  let sum = 0;
  for (let i = 0; i < rows; i += 1) {
    let slot = Math.floor((x[i] as number) * perX) & mask;
    if (y !== undefined) slot += (Math.floor((y[i] as number) * perY) & mask) * bins;
    if (z !== undefined) slot += (Math.floor((z[i] as number) * perZ) & mask) * square;
    if (slot !== current) {
      counts[current] = (counts[current] as number) + count;
      logs[current] = (logs[current] as number) + sum;
      current = slot;
      count = 0;
      sum = 0;
    }
    const high = words[2 * i + 1] as number;
    count += 1;
    sum += ((high >> 20) - 1023) * logUnits + (table[(high >> shift) & lowest] as number);
  }
  counts[current] = (counts[current] as number) + count;
  logs[current] = (logs[current] as number) + sum;
}
