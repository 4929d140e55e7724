/** Some of the rows of a grid, column by column. */
export interface MeshRows {
  rows: number;
  /** x, and y and z where there are any. */
  coordinates: readonly Float64Array[];
  /** The column of times, where rows of several times may stand in one file. */
  times: Float64Array | null;
  /** Sizes of the cells as length, area or volume; null where rows weigh the same. */
  weights: Float64Array | null;
  /** Sizes of the cells along each direction, none where the file has no such columns. */
  extents: readonly Float64Array[];
}

/** Hashes of the coordinates of some of the rows: of those whose hash is a multiple of 2^level. */
export interface CoordinatePart { level: number; hashes: Float64Array }

/**
 * Bins with rows, of 2^exponent along each direction: their indices (multiples of that size) along each direction in turn, their
 * rows, and the sum of log2 V of these in units of 2^-16, which are whole numbers, so that no order of adding them matters.
 */
export interface RasterPart { exponents: number[]; indices: number[][]; counts: number[]; logs: number[] }

/** What is known of the mesh beside norms, over some of the rows: plain data, which a thread can hand to another. */
export interface MeshPart {
  low: number[];
  high: number[];
  coordinates: CoordinatePart;
  raster: RasterPart | null;
  /** Σ ln of the extents along each direction. */
  extentLogs: number[];
}

/**
 * The mesh of a grid as its file shows it. `low` and `high` bound the coordinates. `duplicates.rows` have the coordinates of
 * an earlier row, estimated from one row in `oneIn` (1: all were looked at). `sizes` is a raster of mean sizes of cells, and
 * `extents` the geometric mean of their size along each direction, where they were asked for.
 */
export interface MeshSurvey {
  low: number[];
  high: number[];
  duplicates: { rows: number; oneIn: number };
  sizes?: SizeRaster;
  extents?: number[];
}

/** The same bins with the mean of log2 V of the rows of each. */
export type SizeRaster = RasterPart;
