import { mapSide, planesOf, type MapTask } from './error-map';
import { startLattice, type MapLattice } from './map-lattice';

/** Where one thread gathers maps: the lattice, then plane after plane the fields of bin after bin. Shared, so that another may draw from it. */
export type MapRoom = SharedArrayBuffer;

export interface PlaneRoom {
  /** The largest |e| of bin · fields + field, −1 where no row fell into the bin. */
  largest: Float32Array;
  /** Bins along the first direction. */
  width: number;
  axes: readonly number[];
}

export interface OpenRoom {
  lattice: () => MapLattice;
  keepLattice: (lattice: MapLattice) => void;
  planes: PlaneRoom[];
}

/** The exponent and the first and last bins of up to three directions. */
const headNumbers = 7;

function planeSizes(task: MapTask): { width: number; bins: number; axes: readonly number[] }[] {
  const { exponent, last } = startLattice(task);
  const count = (axis: number | undefined) => (axis === undefined ? 1 : exponent === null ? (last[axis] ?? 0) + 1 : mapSide);
  return planesOf[task.dimension].map(({ axes }) => ({ axes, width: count(axes[0]), bins: count(axes[0]) * count(axes[1]) }));
}

/** Room for the maps of a task, with no row in it. */
export function createMapRoom(task: MapTask): MapRoom {
  const bins = planeSizes(task).reduce((sum, plane) => sum + plane.bins, 0);
  const room = new SharedArrayBuffer(headNumbers * 8 + bins * task.fields.length * 4);
  const { planes, keepLattice } = openMapRoom(room, task);
  for (const { largest } of planes) largest.fill(-1);
  keepLattice(startLattice(task));
  return room;
}

/** A room as its parts. */
export function openMapRoom(room: MapRoom, task: MapTask): OpenRoom {
  const head = new Float64Array(room, 0, headNumbers);
  const { dimension, fields } = task;
  let at = headNumbers * 8;
  const planes = planeSizes(task).map(({ width, bins, axes }): PlaneRoom => {
    const largest = new Float32Array(room, at, bins * fields.length);
    at += largest.byteLength;
    return { largest, width, axes };
  });
  return {
    planes,
    lattice: () => ({ exponent: Number.isNaN(head[0]) ? null : (head[0] as number), first: [...head.subarray(1, 1 + dimension)], last: [...head.subarray(4, 4 + dimension)] }),
    keepLattice({ exponent, first, last }) {
      head[0] = exponent ?? NaN;
      head.set(first, 1);
      head.set(last, 4);
    },
  };
}
