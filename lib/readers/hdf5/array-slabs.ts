import { elementsOf } from '../arrays/array-columns';
import type { Hdf5File } from './hdf5-file';
import type { StoredArray } from './stored-arrays';

/** Consecutive elements of an array, the last dimension running fastest. */
export interface Slab {
  from: number;
  elements: number;
  bytes: DataView;
}

interface SlabShape {
  /** The dimension along which slabs are cut; of those before it each slab has one index, of those after it all. */
  axis: number;
  step: number;
}

const usualBytes = 1024 * 1024;
const mostBytes = 64 * 1024 * 1024;

/** Bytes of the largest slab. */
export function slabBytes(array: StoredArray): number {
  const { axis, step } = shapeSlabs(array);
  return Math.min(step, array.dims[axis] ?? 1) * elementsOf(array.dims.slice(axis + 1)) * array.size;
}

/** About 1 MiB, or whole chunks where these are larger, so that each is unpacked once. */
function shapeSlabs({ dims, size, chunks }: StoredArray): SlabShape {
  const behind = (axis: number) => elementsOf(dims.slice(axis + 1)) * size;
  const chunk = chunks?.[0] ?? 1;
  if (chunk * behind(0) <= mostBytes) return { axis: 0, step: chunk * Math.max(1, Math.floor(usualBytes / Math.max(1, chunk * behind(0)))) };
  let axis = 0;
  // A row of a vector is never cut.
  while (axis < dims.length - 2 && behind(axis) > usualBytes) axis += 1;
  if (behind(axis) > mostBytes) axis = dims.length - 1;
  const along = Math.max(1, Math.floor(usualBytes / Math.max(1, behind(axis))));
  const packed = chunks?.[axis] ?? 1;
  return { axis, step: along > packed ? along - (along % packed) : along };
}

/** Reads an array from its beginning, slab by slab; the bytes of one are those of the next, too. */
export function* readSlabs(file: Hdf5File, array: StoredArray): Generator<Slab, void> {
  const { path, dims, size } = array;
  if (dims.length === 0) {
    yield { from: 0, elements: 1, bytes: viewOf(file.read(path, { offset: [], count: [], size })) };
    return;
  }
  const { axis, step } = shapeSlabs(array);
  const leading = elementsOf(dims.slice(0, axis));
  const behind = dims.slice(axis + 1);
  const along = dims[axis] ?? 0;
  let room: Uint8Array | undefined;
  for (let index = 0; index < leading; index += 1) {
    for (let start = 0; start < along; start += step) {
      const count = Math.min(step, along - start);
      const bytes = file.read(path, {
        offset: [...unravel(index, dims.slice(0, axis)), start, ...behind.map(() => 0)], count: [...dims.slice(0, axis).map(() => 1), count, ...behind], size,
      }, room);
      room ??= bytes;
      yield { from: (index * along + start) * elementsOf(behind), elements: count * elementsOf(behind), bytes: viewOf(bytes) };
    }
  }
}

function unravel(index: number, dims: readonly number[]): number[] {
  let rest = index;
  return dims.toReversed().map((dim) => {
    const at = rest % dim;
    rest = (rest - at) / dim;
    return at;
  }).reverse();
}

const viewOf = (bytes: Uint8Array): DataView => new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
