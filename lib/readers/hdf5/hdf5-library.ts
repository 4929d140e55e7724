import type { Filter, Metadata } from 'h5wasm';

interface StreamOps { read(stream: unknown, buffer: Uint8Array, offset: number, length: number, position: number): number }
interface FileNode { usedBytes: number; stream_ops: StreamOps }

/** What is used of the HDF5 library, compiled to WebAssembly with a file system of its own. */
export interface Hdf5Library {
  readonly HEAPU8: Uint8Array;
  readonly H5F_ACC_RDONLY: number;
  readonly H5G_DATASET: number;
  readonly FS: { writeFile(path: string, data: Uint8Array): void; unlink(path: string): void; lookupPath(path: string): { node: FileNode } };
  _malloc(bytes: number): number;
  _free(pointer: number): void;
  open(path: string, mode: number, tracksOrder: boolean, lowest: number, highest: number): bigint;
  close_file(file: bigint): number;
  get_names(file: bigint, path: string, recursive: boolean): string[];
  get_type(file: bigint, path: string): number;
  get_dataset_metadata(file: bigint, path: string): Metadata;
  get_dataset_filters(file: bigint, path: string): Filter[];
  get_dataset_data(file: bigint, path: string, count: bigint[] | null, offset: bigint[] | null, stride: bigint[] | null, into: bigint): number;
}

export interface LoadedLibrary {
  library: Hdf5Library;
  /** What it has complained of since this was last asked: the innermost complaint. */
  complaint(): string | null;
}

/**
 * The library anew, for one file: what a damaged chunk leaves unread is memory as it was, and must not be that of another
 * file. It is the build for browsers, which sees no file but those given to it: a file that refers to other files on the
 * machine finds none.
 */
export async function startLibrary(): Promise<LoadedLibrary> {
  // The package itself starts one instance for good; the module below it makes as many as are needed.
  const place = new URL('./hdf5_util.js', import.meta.resolve('h5wasm')).href;
  const { default: start } = await import(place) as { default: (options: object) => Promise<Hdf5Library> };
  const lines: string[] = [];
  const printErr = (line: string) => {
    if (lines.length < 1000) lines.push(line);
  };
  const library = await start({ noInitialRun: true, printErr });
  return {
    library,
    complaint() {
      const said = lines.splice(0).flatMap((line) => /#\d+: .* in \w+\(\): (.*)/.exec(line)?.[1] ?? []);
      return said.at(-1) ?? null;
    },
  };
}
