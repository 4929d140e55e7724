import { planesOf, type ErrorMap, type MapAxis, type MapTask } from './error-map';
import { joinLattices, startLattice, wholePlace, type MapLattice } from './map-lattice';
import { openMapRoom, type MapRoom, type OpenRoom } from './map-room';

/** A bin may be this much smaller than a cell; finer rasters have holes. */
const finest = 1.1;
const names: readonly MapAxis[] = ['x', 'y', 'z'];
const largestSingle = 2 ** 127 * (2 - 2 ** -23);

/** The bins of a map along one direction: `size` of them from `first` on, each as wide as `width` of the lattice of the given exponent. */
interface DrawnAxis { first: number; width: number; count: number; bounds: [number, number] }

/**
 * Draws the map of every field on every plane from what threads gathered: about one bin a cell, 256 at most along each
 * direction. Where the size of a cell is not known it is that of equal cells which as many as there are rows would fill
 * the bounds with. Errors are kept to the 24 bits of a single.
 */
export function drawMaps(task: MapTask, rooms: readonly MapRoom[], rows: number): ErrorMap[] {
  const opened = rooms.map((room) => openMapRoom(room, task));
  const lattice = opened.reduce((joined, room) => joinLattices(joined, room.lattice()), startLattice(task));
  const axes = task.box === null ? rowAxes(task, lattice, rows) : boxAxes(task, lattice, rows);
  return task.fields.flatMap((field, index) => planesOf[task.dimension].map(({ plane, axes: shown }, at) => {
    const drawn = shown.map((axis) => axes[axis] as DrawnAxis);
    const bounds: ErrorMap['bounds'] = {};
    for (const axis of shown) bounds[names[axis] ?? 'x'] = axes[axis]?.bounds;
    const errors = new Float32Array((drawn[0]?.count ?? 1) * (drawn[1]?.count ?? 1)).fill(NaN);
    for (const room of opened) fill(errors, room, { lattice, plane: at, field: index, fieldCount: task.fields.length, drawn });
    return { field, plane, bounds, width: drawn[0]?.count ?? 1, height: drawn[1]?.count ?? 1, ...toShares(errors) };
  }));
}

function cellSize({ dimension }: MapTask, lengths: readonly number[], rows: number): number {
  return (lengths.reduce((product, length) => product * length, 1) / rows) ** (1 / dimension);
}

function boxAxes(task: MapTask, { last }: MapLattice, rows: number): DrawnAxis[] {
  const sides = (task.box ?? []).map(([low, high]): [number, number] => [low, high]);
  const h = task.h ?? cellSize(task, sides.map(([low, high]) => high - low), rows);
  return sides.map((bounds, axis) => {
    let count = (last[axis] ?? 0) + 1;
    let width = 1;
    // Where the size of a cell was known the lattice was made for it.
    while (task.h === null && count > 1 && count * h > finest * (bounds[1] - bounds[0])) [count, width] = [count / 2, width * 2];
    return { first: 0, width, count, bounds };
  });
}

function rowAxes(task: MapTask, { exponent, first, last }: MapLattice, rows: number): DrawnAxis[] {
  const bin = 2 ** (exponent ?? 0);
  const lengths = first.map((from, axis) => ((last[axis] ?? from) - from + 1) * bin);
  const h = task.h ?? cellSize(task, lengths, rows);
  let width = 1;
  while (bin * width * finest < h) width *= 2;
  return first.map((from, axis) => {
    const [low, high] = [Math.floor(from / width), Math.floor((last[axis] ?? from) / width)];
    return { first: low, width, count: high - low + 1, bounds: [low * width * bin, (high + 1) * width * bin] };
  });
}

interface Filling { lattice: MapLattice; plane: number; field: number; fieldCount: number; drawn: readonly DrawnAxis[] }

function fill(errors: Float32Array, room: OpenRoom, { lattice, plane, field, fieldCount, drawn: [along, up] }: Filling): void {
  const own = room.planes[plane];
  if (own === undefined || along === undefined) throw new TypeError('drawMaps: the room is of another task');
  const { exponent, first } = room.lattice();
  const scale = exponent === null ? 1 : 2 ** (exponent - (lattice.exponent ?? 0));
  const place = (part: number, { width, first: from }: DrawnAxis, axis: number) => {
    const whole = exponent === null ? part : Math.floor(wholePlace(part, first[axis] ?? 0) * scale);
    return Math.floor(whole / width) - from;
  };
  for (let bin = 0; bin * fieldCount < own.largest.length; bin += 1) {
    const value = own.largest[bin * fieldCount + field] as number;
    if (value < 0) continue;
    const row = up === undefined ? 0 : place(Math.floor(bin / own.width), up, own.axes[1] ?? 0);
    const index = row * along.count + place(bin % own.width, along, own.axes[0] ?? 0);
    if (!(value <= (errors[index] as number))) errors[index] = Math.min(value, largestSingle);
  }
}

function toShares(errors: Float32Array): Pick<ErrorMap, 'largest' | 'shares'> {
  let largest = 0;
  for (const value of errors) if (value > largest) largest = value;
  if (largest > 0) for (let at = 0; at < errors.length; at += 1) errors[at] = (errors[at] as number) / largest;
  return { largest, shares: errors };
}
