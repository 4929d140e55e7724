import type { Interval } from '../regions/bands';

export const mapPlanes = ['x', 'xy', 'xz', 'yz'] as const;
export type MapPlane = (typeof mapPlanes)[number];
export type MapAxis = 'x' | 'y' | 'z';

/** The largest bins of a map along each direction. */
export const mapSide = 256;

/** The planes that a grid is looked at in, each with the coordinates along its width and height. */
export const planesOf: Record<1 | 2 | 3, readonly { plane: MapPlane; axes: readonly number[] }[]> = {
  1: [{ plane: 'x', axes: [0] }],
  2: [{ plane: 'xy', axes: [0, 1] }],
  3: [{ plane: 'xy', axes: [0, 1] }, { plane: 'xz', axes: [0, 2] }, { plane: 'yz', axes: [1, 2] }],
};

/** What a map is to be of: plain data, which a thread can hand to another. */
export interface MapTask {
  /** Of the fields that are read. */
  fields: readonly string[];
  dimension: 1 | 2 | 3;
  /** The bounds of the map; null where the rows themselves tell them. */
  box: readonly Interval[] | null;
  /** The size of a cell, where it is known before the rows are. */
  h: number | null;
}

/** A raster of the largest |e| of the rows that fall into each bin, over all that lies along the third direction. */
export interface ErrorMap {
  field: string;
  plane: MapPlane;
  width: number;
  /** 1 where there is no second direction. */
  height: number;
  bounds: Partial<Record<MapAxis, [number, number]>>;
  largest: number;
  /** Share of the largest, width times height, from the lowest second coordinate on; NaN where no row fell into the bin. */
  shares: Float32Array;
}
