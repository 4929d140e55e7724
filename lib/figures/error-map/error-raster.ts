/** A direction of a map: what lies along it, between which bounds, in how many bins. */
export interface RasterAxis { name: 'x' | 'y' | 'z'; from: number; to: number; bins: number }

export interface ErrorRaster {
  along: RasterAxis;
  /** Null where there is one direction only. */
  up: RasterAxis | null;
  /** The direction that is looked along, of which a bin holds all; null where there is none. */
  over: 'x' | 'y' | 'z' | null;
  /** The largest |e| in each bin, row by row from the lowest on; null where no row of the file fell. */
  errors: readonly (number | null)[];
}

/** Column and row of a bin, from the lower left. */
export interface Bin { column: number; row: number }

const single = { bins: 1 };
export const rowsOf = ({ up }: ErrorRaster): number => (up ?? single).bins;
export const errorIn = (raster: ErrorRaster, { column, row }: Bin): number | null => raster.errors[row * raster.along.bins + column] ?? null;

/** The bounds of a bin along one direction. */
export function boundsOf({ from, to, bins }: RasterAxis, place: number): [number, number] {
  const side = (to - from) / bins;
  return [from + place * side, place === bins - 1 ? to : from + (place + 1) * side];
}

/** The bin that holds the largest error; the first in reading order from the lower left where several do. Null where all are empty. */
export function largestBin(raster: ErrorRaster): Bin | null {
  let best = -1;
  for (const [index, error] of raster.errors.entries()) {
    if (error !== null && (best < 0 || error > (raster.errors[best] ?? 0))) best = index;
  }
  return best < 0 ? null : { column: best % raster.along.bins, row: Math.floor(best / raster.along.bins) };
}
