import fs from 'node:fs';
import type { Filter, Metadata } from 'h5wasm';
import { refuseManyColumns } from '../column-limit';
import { RejectedFile } from '../rejected-file';
import type { TemporaryFile } from '../temporary-file';
import { startLibrary, type LoadedLibrary } from './hdf5-library';

/** An HDF5 file. Whatever cannot be read of it throws RejectedFile with what the library says. */
export interface Hdf5File {
  /** Paths of all datasets that links inside the file lead to. */
  datasets(): string[];
  describe(path: string): { metadata: Metadata; filters: Filter[] };
  /** A block of a dataset as bytes, `size` for each of its elements; in the beginning of `room` where that is large enough. */
  read(path: string, block: { offset: readonly number[]; count: readonly number[]; size: number }, room?: Uint8Array): Uint8Array;
  close(): void;
}

const place = '/file.h5';

/** Opens a file that lies on disk; it stays open until its own close. */
export async function openHdf5(file: TemporaryFile): Promise<Hdf5File> {
  const loaded = await startLibrary();
  const { library } = loaded;
  library.FS.writeFile(place, new Uint8Array(0));
  const { node } = library.FS.lookupPath(place);
  const size = file.size();
  node.usedBytes = size;
  node.stream_ops = {
    ...node.stream_ops,
    read: (_stream, buffer, offset, length, position) => fs.readSync(file.descriptor, buffer, offset, Math.max(0, Math.min(length, size - position)), position),
  };
  const id = guard(loaded, () => library.open(place, library.H5F_ACC_RDONLY, false, -1, -1));
  if (id < 0) {
    library.FS.unlink(place);
    throw damaged(loaded.complaint());
  }
  return {
    datasets() {
      const names = guard(loaded, () => library.get_names(id, '/', true));
      const complaint = loaded.complaint();
      if (complaint !== null) throw damaged(complaint);
      refuseManyColumns(names.length);
      const paths = names.filter((name) => guard(loaded, () => library.get_type(id, `/${name}`)) === library.H5G_DATASET);
      // It complains of links that lead nowhere, which are none of the columns.
      loaded.complaint();
      return paths;
    },
    describe: (path) => guard(loaded, () => ({ metadata: library.get_dataset_metadata(id, `/${path}`), filters: library.get_dataset_filters(id, `/${path}`) })),
    read(path, { offset, count, size: each }, room) {
      const bytes = count.reduce((product, dim) => product * dim, each);
      return guard(loaded, () => {
        const pointer = library._malloc(bytes);
        if (pointer === 0) throw damaged(`no memory for ${bytes} bytes`);
        // What the library leaves as it was is not a number then.
        library.HEAPU8.fill(0xff, pointer, pointer + bytes);
        try {
          // A scalar has no block to choose.
          const [counts, offsets, strides] = count.length === 0 ? [null, null, null] : [count.map(BigInt), offset.map(BigInt), count.map(() => 1n)];
          const status = library.get_dataset_data(id, `/${path}`, counts, offsets, strides, BigInt(pointer));
          if (status < 0) throw damaged(loaded.complaint());
          const found = library.HEAPU8.subarray(pointer, pointer + bytes);
          if (room === undefined || room.length < bytes) return found.slice();
          room.set(found);
          return room.subarray(0, bytes);
        } finally {
          library._free(pointer);
        }
      });
    },
    close() {
      guard(loaded, () => library.close_file(id));
      library.FS.unlink(place);
      loaded.complaint();
    },
  };
}

function damaged(complaint: string | null): RejectedFile {
  return new RejectedFile([{
    code: 'damaged-file', count: 1, line: null, column: null, found: `the HDF5 library says “${(complaint ?? 'it cannot be read').slice(0, 200)}”`, expected: 'a complete HDF5 file',
  }]);
}

/** Runs the library; its giving up is damage of the file. */
function guard<Result>(loaded: LoadedLibrary, work: () => Result): Result {
  try {
    return work();
  } catch (error) {
    const isTrap = error instanceof WebAssembly.RuntimeError || error instanceof RangeError;
    // What the library throws is a plain Error; errors of the disk have a code.
    const isOwn = error instanceof Error && Object.getPrototypeOf(error) === Error.prototype && !('code' in error);
    if (!isTrap && !isOwn) throw error;
    throw damaged(loaded.complaint() ?? error.message);
  }
}
