import type { Filter, Metadata } from 'h5wasm';
import type { NamedArray } from '../arrays/array-columns';
import { layOutElement, type PlacedMember } from './element-layout';
import type { Hdf5File } from './hdf5-file';

export interface StoredArray extends NamedArray {
  members: PlacedMember[];
  /** Bytes of one element. */
  size: number;
  chunks: readonly number[] | null;
}

/** Read whole, since a chunk is packed as one. */
const largestChunk = 64 * 1024 * 1024;
/** Of the library itself: deflate, shuffle, fletcher32, nbit, scale-offset (H5Zpublic.h). */
const knownFilters: ReadonlySet<number> = new Set([1, 2, 3, 5, 6]);

/** The arrays of a file in the order of their paths; of those that are not read, why. */
export function listArrays(file: Hdf5File): StoredArray[] {
  return file.datasets().map((path) => {
    const { metadata, filters } = file.describe(path);
    const problem = problemOf(metadata, filters);
    const members = layOutElement(metadata);
    return {
      path, dims: metadata.shape ?? [0], size: metadata.size, chunks: metadata.chunks,
      members: problem === null ? members : members.map((member) => ({ ...member, problem })),
    };
  });
}

function problemOf({ virtual_sources: sources, chunks, size, shape }: Metadata, filters: readonly Filter[]): string | null {
  if (sources) return 'a view of datasets elsewhere';
  const filter = filters.find(({ id }) => !knownFilters.has(id));
  if (filter) return `packed by the filter ${filter.name === '' ? filter.id : filter.name}, which is not read`;
  if (shape?.some((dim) => !Number.isSafeInteger(dim)) === true) return 'more values than can be counted';
  const chunk = (chunks ?? []).reduce((product, dim) => product * dim, size);
  return chunk > largestChunk ? `chunks of ${Math.round(chunk / 1048576)} MiB, where at most ${largestChunk / 1048576} are read` : null;
}
