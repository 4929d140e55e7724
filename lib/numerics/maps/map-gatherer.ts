import { mapSide, type MapTask } from './error-map';
import { binsAlong, latticeOfRows, wholePlace, type MapLattice } from './map-lattice';
import { openMapRoom, type MapRoom, type PlaneRoom } from './map-room';

interface MapBlock {
  rows: number;
  /** Coordinates, as many as the task has dimensions. */
  axes: readonly Float64Array[];
  /** In the order of the fields of the task. */
  fields: readonly { values: Float64Array; exact: Float64Array }[];
}

/** Gathers into a room, block by block, the largest error of every bin, field and plane; in which order the rows come does not matter. */
export function createMapGatherer(task: MapTask, room: MapRoom): (block: MapBlock) => void {
  const { planes, lattice: kept, keepLattice } = openMapRoom(room, task);
  const fieldCount = task.fields.length;
  let bins: Int32Array[] = [];
  let places: Int32Array[] = [];
  let lattice = kept();
  return ({ rows, axes, fields }) => {
    if ((bins[0]?.length ?? 0) < rows) {
      bins = axes.map(() => new Int32Array(rows));
      places = planes.map(() => new Int32Array(rows));
    }
    const wider = latticeOfRows(lattice, axes, rows);
    if (wider !== lattice) {
      for (const plane of planes) moveBins(plane, fieldCount, { from: lattice, to: wider });
      lattice = wider;
      keepLattice(lattice);
    }
    for (const [axis, values] of axes.entries()) binsAlong(values, rows, { lattice, axis, box: task.box }, bins[axis] as Int32Array);
    for (const [index, { width, axes: [along = 0, up] }] of planes.entries()) {
      placeRows(bins[along] as Int32Array, up === undefined ? null : (bins[up] as Int32Array), { rows, width, fieldCount }, places[index] as Int32Array);
    }
    const [first, second, third] = planes.map(({ largest }, index) => ({ largest, places: places[index] as Int32Array }));
    for (const [field, { values, exact }] of fields.entries()) {
      const errors = { field, rows, values, exact };
      if (first && second && third) takeOnThree(errors, first, second, third);
      else if (first) takeOnOne(errors, first);
    }
  };
}

function placeRows(along: Int32Array, up: Int32Array | null, { rows, width, fieldCount }: { rows: number; width: number; fieldCount: number }, into: Int32Array): void {
  if (up === null) for (let i = 0; i < rows; i += 1) into[i] = (along[i] as number) * fieldCount;
  else for (let i = 0; i < rows; i += 1) into[i] = ((up[i] as number) * width + (along[i] as number)) * fieldCount;
}

interface Errors { field: number; rows: number; values: Float64Array; exact: Float64Array }
interface Placed { largest: Float32Array; places: Int32Array }

function takeOnOne({ field, rows, values, exact }: Errors, { largest, places }: Placed): void {
  for (let i = 0; i < rows; i += 1) {
    const size = Math.abs((values[i] as number) - (exact[i] as number));
    const at = (places[i] as number) + field;
    if (size > (largest[at] as number)) largest[at] = size;
  }
}

/** The same on three planes in one loop, which takes half as long as three. */
function takeOnThree({ field, rows, values, exact }: Errors, a: Placed, b: Placed, c: Placed): void {
  const { largest: ofA, places: inA } = a;
  const { largest: ofB, places: inB } = b;
  const { largest: ofC, places: inC } = c;
  for (let i = 0; i < rows; i += 1) {
    const size = Math.abs((values[i] as number) - (exact[i] as number));
    if (size > (ofA[(inA[i] as number) + field] as number)) ofA[(inA[i] as number) + field] = size;
    if (size > (ofB[(inB[i] as number) + field] as number)) ofB[(inB[i] as number) + field] = size;
    if (size > (ofC[(inC[i] as number) + field] as number)) ofC[(inC[i] as number) + field] = size;
  }
}

/** Moves what is in a plane into the bins of a coarser lattice. */
function moveBins({ largest, axes: [along = 0, up] }: PlaneRoom, fieldCount: number, { from, to }: { from: MapLattice; to: MapLattice }): void {
  if (from.exponent === null || to.exponent === null || from.exponent === -Infinity || from.exponent === to.exponent) return;
  const scale = 2 ** (from.exponent - to.exponent);
  const move = (part: number, axis: number) => Math.floor(wholePlace(part, from.first[axis] ?? 0) * scale) & (mapSide - 1);
  const before = largest.slice();
  largest.fill(-1);
  for (let bin = 0; bin * fieldCount < before.length; bin += 1) {
    const moved = (up === undefined ? 0 : move(Math.floor(bin / mapSide), up) * mapSide) + move(bin % mapSide, along);
    for (let field = 0; field < fieldCount; field += 1) {
      const value = before[bin * fieldCount + field] as number;
      const into = moved * fieldCount + field;
      if (value > (largest[into] as number)) largest[into] = value;
    }
  }
}
