import { createCoordinateSample } from './coordinate-sample';
import type { MeshPart, MeshRows } from './mesh-part';
import { createSizeRaster } from './size-raster';

export interface MeshGatherer {
  add(block: MeshRows): void;
  /** What was added since the last part; null where nothing was. */
  takePart(): MeshPart | null;
}

/**
 * Gathers block by block what checks between grids are made of: bounds, coordinates that repeat, and sizes of cells where
 * they come with the rows. Parts may be taken one after another.
 */
export function createMeshGatherer(dimension: number): MeshGatherer {
  const sample = createCoordinateSample();
  const raster = createSizeRaster(dimension);
  const start = () => ({ rows: 0, low: Array.from({ length: dimension }, () => Infinity), high: Array.from({ length: dimension }, () => -Infinity), extentLogs: [] as number[] });
  let now = start();
  return {
    add({ rows, coordinates, times, weights, extents }) {
      if (rows === 0) return;
      now.rows += rows;
      const bounds = coordinates.map((column) => boundsOf(column, rows));
      const [low, high] = [bounds.map(([least]) => least), bounds.map(([, most]) => most)];
      low.forEach((value, axis) => { now.low[axis] = Math.min(now.low[axis] ?? value, value); });
      high.forEach((value, axis) => { now.high[axis] = Math.max(now.high[axis] ?? value, value); });
      sample.add(rows, times === null ? coordinates : [...coordinates, times]);
      // Coordinates that are not finite are told of as such by who read them.
      if (weights !== null && low.every(Number.isFinite) && high.every(Number.isFinite)) raster.add({ rows, coordinates, weights, low, high });
      now.extentLogs = extents.map((column, axis) => (now.extentLogs[axis] ?? 0) + sumOfLogs(column, rows));
    },
    takePart() {
      const { rows, ...part } = now;
      now = start();
      return rows === 0 ? null : { ...part, coordinates: sample.takePart(), raster: raster.takePart() };
    },
  };
}

function boundsOf(values: Float64Array, rows: number): [number, number] {
  let least = Infinity;
  let most = -Infinity;
  for (let i = 0; i < rows; i += 1) {
    const value = values[i] as number;
    if (value < least) least = value;
    if (value > most) most = value;
  }
  return [least, most];
}

function sumOfLogs(values: Float64Array, rows: number): number {
  let sum = 0;
  for (let i = 0; i < rows; i += 1) sum += Math.log(values[i] as number);
  return sum;
}
