import type { Box } from '../scene';
import { boundsOf, rowsOf, type Bin, type ErrorRaster } from './error-raster';

const metrics = { left: 50, top: 34, foot: 42, gap: 20, bar: 14, labels: 44 };
const highest = 320;
const lowest = 64;
const stripHeight = 36;
const barLowest = 120;

export interface MapLayout {
  width: number;
  height: number;
  /** Where the bins are drawn. */
  box: Box;
  /** Where the scale is drawn. */
  bar: Box;
  /** Whether both directions have one scale. */
  isToScale: boolean;
}

/** Places a map in a width: both directions to one scale as long as neither gets too thin to be seen. */
export function mapLayout(raster: ErrorRaster, available: number): MapLayout {
  const room = Math.max(lowest, available - metrics.left - metrics.gap - metrics.bar - metrics.labels);
  const { along, up } = raster;
  const ratio = up === null ? null : (up.to - up.from) / (along.to - along.from);
  const width = ratio === null ? room : Math.min(room, Math.max(lowest, Math.round(highest / ratio)));
  const height = ratio === null ? stripHeight : Math.min(highest, Math.max(lowest, Math.round(width * ratio)));
  const isToScale = ratio === null || Math.abs(height / width / ratio - 1) < 0.02;
  const box = { left: metrics.left, top: metrics.top, width, height };
  const bar = { left: box.left + width + metrics.gap, top: metrics.top, width: metrics.bar, height: Math.max(height, barLowest) };
  return { width: bar.left + bar.width + metrics.labels, height: metrics.top + Math.max(height + metrics.foot, bar.height + 10), box, bar, isToScale };
}

const clampPlace = (place: number, bins: number) => Math.min(bins - 1, Math.max(0, place));

/** The bin under a place in pixels; the nearest one where it is outside. */
export function binAt(raster: ErrorRaster, { box }: MapLayout, [x, y]: readonly [number, number]): Bin {
  const rows = rowsOf(raster);
  return {
    column: clampPlace(Math.floor(((x - box.left) / box.width) * raster.along.bins), raster.along.bins),
    row: clampPlace(Math.floor(((box.top + box.height - y) / box.height) * rows), rows),
  };
}

/** What a bin covers, in pixels. */
export function boxOf(raster: ErrorRaster, { box }: MapLayout, { column, row }: Bin): Box {
  const [wide, high] = [box.width / raster.along.bins, box.height / rowsOf(raster)];
  return { left: box.left + column * wide, top: box.top + box.height - (row + 1) * high, width: wide, height: high };
}

/** Pixels of a place of the domain. */
export function placeOf({ along, up }: ErrorRaster, { box }: MapLayout, at: Partial<Record<'x' | 'y' | 'z', number>>): readonly [number, number] | null {
  const x = at[along.name];
  const y = up === null ? 0.5 : at[up.name];
  if (x === undefined || y === undefined) return null;
  const share = up === null ? y : (y - up.from) / (up.to - up.from);
  return [box.left + ((x - along.from) / (along.to - along.from)) * box.width, box.top + (1 - share) * box.height];
}

/** The bounds of a bin along each direction of the map. */
export function binBounds({ along, up }: ErrorRaster, { column, row }: Bin): { name: string; bounds: [number, number] }[] {
  const first = { name: along.name, bounds: boundsOf(along, column) };
  return up === null ? [first] : [first, { name: up.name, bounds: boundsOf(up, row) }];
}
