import { layOutColumns } from '../arrays/array-columns';
import type { ColumnsPreview } from '../column-format';
import { writeTemporaryFile } from '../temporary-file';
import { openHdf5, type Hdf5File } from './hdf5-file';
import { listArrays, type StoredArray } from './stored-arrays';

const shownRows = 10;

/** The columns of an HDF5 file and their first rows. */
export async function previewHdf5(pieces: AsyncIterable<Buffer>): Promise<ColumnsPreview> {
  const stored = await writeTemporaryFile(pieces, () => undefined);
  try {
    const file = await openHdf5(stored);
    try {
      return previewFrom(file);
    } finally {
      file.close();
    }
  } finally {
    stored.close();
  }
}

function previewFrom(file: Hdf5File): ColumnsPreview {
  const arrays = listArrays(file);
  const columns = layOutColumns(arrays);
  const beginnings = new Map<number, DataView>();
  const shown = columns.map(({ array: at, rows, elements, element, member }) => {
    const array = arrays[at];
    const placed = array?.members[member];
    if (!array || !placed || rows === 0) return [];
    const bytes = beginnings.get(at) ?? readBeginning(file, array);
    beginnings.set(at, bytes);
    const values = Array.from({ length: Math.min(rows, shownRows) }, (_, row) => (row * elements + element) * array.size);
    return values.flatMap((start) => (start + array.size <= bytes.byteLength ? [String(placed.decode(bytes, start + placed.offset))] : []));
  });
  const rows = shown.reduce((most, values) => Math.max(most, values.length), 0);
  return {
    delimiter: null, hasHeader: true, header: columns.map(({ name }) => name),
    firstRows: Array.from({ length: rows }, (_, row) => shown.map((values) => values[row] ?? '')),
  };
}

/** The first elements, as many as lie together along the last dimensions. */
function readBeginning(file: Hdf5File, { path, dims, size }: StoredArray): DataView {
  const most = shownRows * Math.min(9, dims.length > 1 ? (dims.at(-1) ?? 1) : 1);
  const count: number[] = [];
  let left = most;
  for (const dim of dims.toReversed()) {
    const some = Math.max(1, Math.min(dim, left));
    count.unshift(some);
    left = some === dim ? Math.ceil(left / dim) : 1;
  }
  const bytes = file.read(path, { offset: dims.map(() => 0), count, size });
  return new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
}
