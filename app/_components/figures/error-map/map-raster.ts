import type { GridMapBins } from '@/lib/domain/studies/map-schema';
import type { ErrorRaster, RasterAxis } from '@/lib/figures/error-map/error-raster';

const directions = ['x', 'y', 'z'] as const;

/** A map as the figure takes it. Rows that all lie at one place give it no width; it is then drawn one wide. */
export function toRaster({ plane, width, height, bounds, rows }: Pick<GridMapBins, 'plane' | 'width' | 'height' | 'bounds' | 'rows'>, dimension: number): ErrorRaster {
  const [along = 'x', up] = directions.filter((name) => plane.includes(name));
  const axis = (name: RasterAxis['name'], bins: number): RasterAxis => {
    const [from, to] = bounds[name] ?? [0, 1];
    return from < to ? { name, from, to, bins } : { name, from: from - 0.5, to: from + 0.5, bins };
  };
  return {
    along: axis(along, width), up: up === undefined ? null : axis(up, height), errors: rows.flat(),
    over: dimension === 3 ? (directions.find((name) => !plane.includes(name)) ?? null) : null,
  };
}
