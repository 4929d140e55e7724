import { createCompensatedSum } from '../norms/compensated-sum';
import type { SumPart } from '../norms/norm-part';
import type { RigidSums } from './rigid-motion';

/** Sums over some of the rows: plain data, which a thread can hand to another. */
export type RigidPart = SumPart[];

interface RigidRows {
  rows: number;
  coordinates: readonly Float64Array[];
  weights: Float64Array | null;
  /** One for each direction. */
  components: readonly { values: Float64Array; exact: Float64Array }[];
}

export interface RigidGatherer {
  add(block: RigidRows): void;
  addPart(part: RigidPart): void;
  /** What was added since the last part. */
  takePart(): RigidPart;
  sums(): RigidSums;
}

// As in norms: sums run plainly over this many rows and are then compensated.
const run = 128;

/**
 * Gathers what the best rigid motion is made of (bestRigidMotion), block by block. Coordinates are taken from `origin`, which
 * lies best in the middle of the domain: far from it, digits are lost.
 */
export function createRigidGatherer(origin: readonly number[]): RigidGatherer {
  const dimension = origin.length;
  const size = dimension + 1;
  const count = (size * (size + 1)) / 2 + dimension * size;
  let sums = Array.from({ length: count }, createCompensatedSum);
  const plain = new Float64Array(count);
  const basis = new Float64Array(size).fill(1);

  const addRow = ({ coordinates, weights, components }: RigidRows, row: number) => {
    const weight = weights === null ? 1 : (weights[row] as number);
    for (let axis = 0; axis < dimension; axis += 1) basis[axis + 1] = ((coordinates[axis] as Float64Array)[row] as number) - (origin[axis] as number);
    let at = 0;
    for (let j = 0; j < size; j += 1) {
      for (let k = j; k < size; k += 1) plain[at] = (plain[at++] as number) + weight * (basis[j] as number) * (basis[k] as number);
    }
    for (let i = 0; i < dimension; i += 1) {
      const { values, exact } = components[i] as RigidRows['components'][number];
      const error = weight * ((values[row] as number) - (exact[row] as number));
      for (let j = 0; j < size; j += 1) plain[at] = (plain[at++] as number) + error * (basis[j] as number);
    }
  };
  return {
    add(block) {
      for (let from = 0; from < block.rows; from += run) {
        plain.fill(0);
        for (let row = from; row < Math.min(from + run, block.rows); row += 1) addRow(block, row);
        sums.forEach((sum, at) => sum.add(plain[at] as number));
      }
    },
    addPart(part) {
      part.forEach((given, at) => sums[at]?.addPart(given));
    },
    takePart() {
      const part = sums.map((sum) => sum.part());
      sums = Array.from({ length: count }, createCompensatedSum);
      return part;
    },
    sums() {
      const values = sums.map((sum) => sum.value());
      const products: number[][] = Array.from({ length: size }, () => Array.from({ length: size }, () => 0));
      let at = 0;
      products.forEach((row, j) => { for (let k = j; k < size; k += 1) row[k] = values[at++] ?? 0; });
      return { origin: [...origin], products, errors: Array.from({ length: dimension }, (_, i) => values.slice(at + i * size, at + (i + 1) * size)) };
    },
  };
}
