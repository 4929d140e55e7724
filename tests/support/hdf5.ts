import h5wasm, { type Dtype } from 'h5wasm';

type Values = Float64Array | Float32Array | Int32Array | Int16Array | Uint8Array | BigInt64Array | string[] | number[] | Map<string, unknown>;

export interface WrittenDataset {
  path: string;
  data: Values;
  shape?: number[];
  dtype?: Dtype;
  chunks?: number[];
  compression?: number;
}

let written = 0;

/** The bytes of an HDF5 file, by the library itself; `also` adds what else a file may hold. */
export async function writeHdf5(datasets: readonly WrittenDataset[], also: (file: InstanceType<typeof h5wasm.File>) => void = () => undefined): Promise<Buffer> {
  const { FS } = await h5wasm.ready;
  written += 1;
  const place = `/written-${written}.h5`;
  const file = new h5wasm.File(place, 'w');
  const made = new Set<string>();
  for (const { path, data, shape, dtype, chunks, compression } of datasets) {
    const parts = path.split('/');
    for (let depth = 1; depth < parts.length; depth += 1) {
      const folder = parts.slice(0, depth).join('/');
      if (!made.has(folder)) file.create_group(folder);
      made.add(folder);
    }
    file.create_dataset({ name: path, data: data as number[], shape, dtype, chunks, compression });
  }
  also(file);
  file.close();
  const bytes = Buffer.from(FS.readFile(place));
  FS.unlink(place);
  return bytes;
}
