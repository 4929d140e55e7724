import { createCoordinateSample } from './coordinate-sample';
import type { MeshPart, MeshSurvey } from './mesh-part';
import { createSizeRaster } from './size-raster';

export interface MeshTotal {
  /** Parts in the order of their rows. */
  add(part: MeshPart, rows: number): void;
  finish(): MeshSurvey | null;
}

/** Puts parts together into the survey of a grid; the same bits whoever gathered them. */
export function createMeshTotal(): MeshTotal {
  const sample = createCoordinateSample();
  let raster: ReturnType<typeof createSizeRaster> | null = null;
  let bounds: { low: number[]; high: number[] } | null = null;
  let extentLogs: number[] = [];
  let rows = 0;
  return {
    add(part, count) {
      rows += count;
      const { low, high } = bounds ?? part;
      bounds = { low: low.map((value, axis) => Math.min(value, part.low[axis] ?? value)), high: high.map((value, axis) => Math.max(value, part.high[axis] ?? value)) };
      sample.addPart(part.coordinates);
      extentLogs = part.extentLogs.map((sum, axis) => sum + (extentLogs[axis] ?? 0));
      if (part.raster === null) return;
      raster ??= createSizeRaster(low.length);
      raster.addPart(part.raster);
    },
    finish() {
      if (bounds === null) return null;
      const sizes = raster?.finish() ?? null;
      return {
        ...bounds, duplicates: sample.duplicates(), ...(sizes !== null && { sizes }),
        ...(extentLogs.length > 0 && { extents: extentLogs.map((sum) => Math.exp(sum / rows)) }),
      };
    },
  };
}
