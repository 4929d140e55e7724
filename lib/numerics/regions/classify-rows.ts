import type { Bands, BandTest, Interval } from './bands';

/** Rows with what tells where they lie; columns that no band asks for are null. */
export interface PlacedRows {
  rows: number;
  /** Coordinates, as many as the box has intervals. */
  axes: readonly Float64Array[];
  weights: Float64Array | null;
  distance: Float64Array | null;
  flag: Float64Array | null;
}

/** The class of every row: bit k is set where it lies in band k. Used again for the next rows. */
export interface RowClasses {
  classes: Uint8Array;
  /** Rows of each class. */
  counts: readonly number[];
  /** How often the class changes from one row to the next. */
  changes: number;
}

/** Coordinates are seldom printed in full: this much of a thickness may be lost. */
const slack = 1e-3;

/**
 * Tells of every row in which bands along the boundary it lies. A row on the edge of a band lies in it, with a thousandth
 * of the thickness to spare; a row outside of the box lies in every band. Throws where a column that a band needs is absent.
 */
export function createRowClassifier({ distance: from, bands }: Bands): (placed: PlacedRows) => RowClasses {
  let distances = new Float64Array(0);
  let classes = new Uint8Array(0);
  return (placed) => {
    const { rows } = placed;
    if (classes.length < rows) {
      classes = new Uint8Array(rows);
      distances = new Float64Array(rows);
    }
    classes.fill(0, 0, rows);
    const measured = from === null ? null : from === 'column' ? need(placed.distance, 'a column of distances') : measure(placed, from, distances);
    for (const [index, { test }] of bands.entries()) mark(classes, 1 << index, { test, placed, measured });
    return { classes, ...count(classes, rows, 1 << bands.length) };
  };
}

function measure({ rows, axes }: PlacedRows, box: readonly Interval[], into: Float64Array): Float64Array {
  for (const [axis, [low, high]] of box.entries()) {
    const values = need(axes[axis], `coordinate ${axis + 1}`);
    const [middle, half] = [(low + high) / 2, (high - low) / 2];
    if (axis === 0) for (let i = 0; i < rows; i += 1) into[i] = half - Math.abs((values[i] as number) - middle);
    else for (let i = 0; i < rows; i += 1) into[i] = Math.min(into[i] as number, half - Math.abs((values[i] as number) - middle));
  }
  return into;
}

interface Marking { test: BandTest; placed: PlacedRows; measured: Float64Array | null }

function mark(classes: Uint8Array, bit: number, { test, placed, measured }: Marking): void {
  const { rows } = placed;
  if (test.by === 'flag') {
    const flags = need(placed.flag, 'a column of flags');
    for (let i = 0; i < rows; i += 1) if (flags[i] !== 0) (classes[i] as number) |= bit;
    return;
  }
  const distances = need(measured, 'distances');
  if (test.by === 'thickness') {
    const thickness = test.thickness * (1 + slack);
    for (let i = 0; i < rows; i += 1) if ((distances[i] as number) <= thickness) (classes[i] as number) |= bit;
    return;
  }
  const weights = need(placed.weights, 'weights');
  let weight = NaN;
  let thickness = NaN;
  for (let i = 0; i < rows; i += 1) {
    if (weights[i] !== weight) {
      weight = weights[i] as number;
      thickness = 2 * weight ** (1 / test.dimension) * (1 + slack);
    }
    if ((distances[i] as number) <= thickness) (classes[i] as number) |= bit;
  }
}

function count(classes: Uint8Array, rows: number, kinds: number): { counts: number[]; changes: number } {
  const counts = Array.from({ length: kinds }, () => 0);
  let changes = 0;
  let from = 0;
  for (let i = 1; i <= rows; i += 1) {
    if (i < rows && classes[i] === classes[from]) continue;
    counts[classes[from] as number] = (counts[classes[from] as number] ?? 0) + i - from;
    changes += 1;
    from = i;
  }
  return { counts, changes: Math.max(0, changes - 1) };
}

function need<Column>(column: Column | null | undefined, what: string): Column {
  if (column === null || column === undefined) throw new TypeError(`createRowClassifier: a band needs ${what}`);
  return column;
}
