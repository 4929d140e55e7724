import { elementsOf, layOutColumns, type ArrayColumn } from '../arrays/array-columns';
import { spreadAxis } from '../arrays/grid-axes';
import { locateArrayColumns } from '../arrays/locate-array-columns';
import type { ColumnsAsked, ColumnsFound } from '../column-format';
import type { ColumnBatch } from '../source';
import { createColumnStore } from '../column-store';
import { createExpansionLimit } from '../expansion-limit';
import { writeTemporaryFile } from '../temporary-file';
import { readSlabs, slabBytes, type Slab } from './array-slabs';
import type { PlacedMember } from './element-layout';
import { openHdf5, type Hdf5File } from './hdf5-file';
import { listArrays, type StoredArray } from './stored-arrays';

const batchRows = 2048;
/** Bytes of slabs of all arrays that are read side by side. */
const usuallyHeld = 128 * 1024 * 1024;

interface PickedColumn { slot: number; element: number; member: PlacedMember }
/** Columns of one array that are read together. */
interface WantedArray { array: StoredArray; elements: number; rows: number; columns: PickedColumn[] }

/** Reads columns of an HDF5 file, which is put on disk first: what is read of it lies anywhere in it. */
export async function readHdf5(pieces: AsyncIterable<Buffer>, asked: ColumnsAsked, mostHeld = usuallyHeld): Promise<ColumnsFound> {
  const stored = await writeTemporaryFile(pieces, asked.onPiece);
  try {
    const file = await openHdf5(stored);
    try {
      return readFrom(file, { stored: stored.size(), mostHeld }, asked);
    } finally {
      file.close();
    }
  } finally {
    stored.close();
  }
}

function readFrom(file: Hdf5File, { stored, mostHeld }: { stored: number; mostHeld: number }, { wanted, reasons, onBatch, onPiece }: ColumnsAsked): ColumnsFound {
  const arrays = listArrays(file);
  const columns = layOutColumns(arrays);
  const { indices, found, rows, aligned } = locateArrayColumns(arrays, columns, { wanted, reasons });
  refuseInflated(gather(arrays, found), stored);
  const isAxis = (slot: number) => typeof aligned[slot]?.inner === 'number';
  const axes = found.flatMap((column, slot) => (isAxis(slot) ? [{ slot, inner: aligned[slot]?.inner ?? 1, values: readAxis(file, arrays, column) }] : []));
  const gathered = gather(arrays, found).map((each) => ({ ...each, columns: each.columns.filter(({ slot }) => !isAxis(slot)) })).filter((each) => each.columns.length > 0);
  let from = 0;
  const deliver = (batch: ColumnBatch) => {
    for (const { slot, inner, values } of axes) spreadAxis(values, inner, { from, count: batch.rows }, batch.columns[slot] as Float64Array);
    from += batch.rows;
    onBatch(batch);
  };
  const isLarge = gathered.reduce((sum, { array }) => sum + slabBytes(array), 0) > mostHeld;
  (isLarge ? readInTurn : readTogether)(file, gathered, { rows, slots: found.length, onBatch: deliver, onPiece });
  return { columns: indices.map((index, slot) => ({ index, significantDigits: null, isSingle: memberOf(arrays, found[slot])?.isSingle })) };
}

const memberOf = (arrays: readonly StoredArray[], column: ArrayColumn | undefined) => (column && arrays[column.array]?.members[column.member]);

interface Delivery { rows: number; slots: number; onBatch: ColumnsAsked['onBatch']; onPiece: () => void }

/** A few bytes can stand for any number of the same value. */
function refuseInflated(wanted: readonly WantedArray[], bytes: number): void {
  const limit = createExpansionLimit();
  limit.noteStored(bytes);
  limit.noteExpanded(wanted.reduce((sum, { array }) => sum + elementsOf(array.dims) * array.size, 0));
}

function readTogether(file: Hdf5File, wanted: readonly WantedArray[], { rows, slots, onBatch, onPiece }: Delivery): void {
  const batch = Array.from({ length: slots }, () => new Float64Array(batchRows));
  const cursors = wanted.map((each) => createCursor(file, each));
  for (let from = 0; from < rows; from += batchRows) {
    const count = Math.min(batchRows, rows - from);
    for (const fill of cursors) fill(from, count, batch);
    onBatch({ rows: count, columns: batch, lines: null });
    onPiece();
  }
}

/** One array after another, where their chunks are too large to be held side by side. */
function readInTurn(file: Hdf5File, wanted: readonly WantedArray[], { rows, slots, onBatch, onPiece }: Delivery): void {
  const store = createColumnStore();
  try {
    const columns = Array.from({ length: slots }, () => store.addColumn());
    const batch = Array.from({ length: slots }, () => new Float64Array(batchRows));
    for (const each of wanted) {
      const fill = createCursor(file, each);
      for (let from = 0; from < rows; from += batchRows) {
        const count = Math.min(batchRows, rows - from);
        fill(from, count, batch);
        for (const { slot } of each.columns) columns[slot]?.addAll(batch[slot] as Float64Array, count);
        onPiece();
      }
    }
    for (let from = 0; from < rows; from += batchRows) {
      const count = Math.min(batchRows, rows - from);
      for (const { slot } of wanted.flatMap((each) => each.columns)) columns[slot]?.copy(from, count, batch[slot] as Float64Array);
      onBatch({ rows: count, columns: batch, lines: null });
      onPiece();
    }
  } finally {
    store.close();
  }
}

function readAxis(file: Hdf5File, arrays: readonly StoredArray[], column: ArrayColumn): Float64Array {
  const values = new Float64Array(column.rows);
  for (const wanted of gather(arrays, [column])) createCursor(file, wanted)(0, column.rows, [values]);
  return values;
}

function gather(arrays: readonly StoredArray[], found: readonly ArrayColumn[]): WantedArray[] {
  const byArray = new Map<string, WantedArray>();
  for (const [slot, { array: at, elements, element, member, rows }] of found.entries()) {
    const array = arrays[at];
    const placed = array?.members[member];
    if (!array || !placed) continue;
    const known = byArray.get(`${at} ${elements}`) ?? { array, elements, rows, columns: [] };
    known.columns.push({ slot, element, member: placed });
    byArray.set(`${at} ${elements}`, known);
  }
  return [...byArray.values()];
}

/** Fills the columns of an array with rows, which must be asked for in their order. */
function createCursor(file: Hdf5File, { array, elements, columns }: WantedArray): (from: number, count: number, into: readonly Float64Array[]) => void {
  const slabs = readSlabs(file, array);
  let slab: Slab | null = null;
  return (from, count, into) => {
    for (let done = 0; done < count;) {
      const first = (from + done) * elements;
      while (slab === null || first >= slab.from + slab.elements) {
        const next = slabs.next();
        if (next.done === true) throw new Error(`readHdf5: ${array.path} ended before row ${from + done}`);
        slab = next.value;
      }
      const some = Math.min(count - done, (slab.from + slab.elements - first) / elements);
      for (const { slot, element, member } of columns) {
        const values = into[slot] as Float64Array;
        let at = (first - slab.from + element) * array.size + member.offset;
        for (let row = done; row < done + some; row += 1, at += elements * array.size) values[row] = member.decode(slab.bytes, at);
      }
      done += some;
    }
  };
}
