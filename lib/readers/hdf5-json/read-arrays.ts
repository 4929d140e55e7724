import { elementsOf, layOutColumns, type ArrayColumn } from '../arrays/array-columns';
import { spreadAxis } from '../arrays/grid-axes';
import { locateArrayColumns } from '../arrays/locate-array-columns';
import type { ColumnsAsked, ColumnsFound, ColumnsPreview } from '../column-format';
import type { ReasonCollector } from '../reason-collector';
import type { DatasetValues } from './dataset-values';
import type { Hdf5Array } from './hdf5-document';

const batchRows = 2048;
const shownRows = 10;
/** Values of one dataset read at once. */
const mostAtOnce = 131_072;

interface WantedArray { array: Hdf5Array; values: DatasetValues; perRow: number; columns: { slot: number; offset: number; index: number }[] }

export function previewArrays(arrays: readonly Hdf5Array[]): ColumnsPreview {
  const columns = layOutColumns(arrays);
  const rows = Math.min(shownRows, Math.max(0, ...columns.map((column) => column.rows)));
  const cell = (column: ArrayColumn, row: number) => {
    const array = arrays[column.array];
    return row < column.rows ? (array?.values?.first[placeOf(column, array).offset + row * placeOf(column, array).perRow] ?? '') : '';
  };
  return {
    delimiter: null, hasHeader: true, header: columns.map(({ name }) => name),
    firstRows: Array.from({ length: rows }, (_, row) => columns.map((column) => cell(column, row))),
  };
}

/** Delivers the columns asked for, whose values are all kept by now. */
export function readArrays(arrays: readonly Hdf5Array[], { wanted, reasons, onBatch, onPiece }: ColumnsAsked): ColumnsFound {
  const columns = layOutColumns(arrays);
  const { indices, found, rows, aligned } = locateArrayColumns(arrays, columns, { wanted, reasons });
  for (const each of gather(arrays, found, indices)) checkValues(each, reasons);
  reasons.throwIfAny();
  const isAxis = (slot: number) => typeof aligned[slot]?.inner === 'number';
  const axes = found.flatMap((column, slot) => (isAxis(slot) ? [{ slot, inner: aligned[slot]?.inner ?? 1, values: readAxis(arrays, column) }] : []));
  const gathered = gather(arrays, found, indices).map((each) => ({ ...each, columns: each.columns.filter(({ slot }) => !isAxis(slot)) })).filter((each) => each.columns.length > 0);
  const perRow = Math.max(1, ...gathered.map((each) => each.perRow));
  const step = Math.max(1, Math.min(batchRows, Math.floor(mostAtOnce / perRow)));
  const batch = found.map(() => new Float64Array(step));
  const flat = new Float64Array(step * perRow);
  for (let from = 0; from < rows; from += step) {
    const count = Math.min(step, rows - from);
    for (const each of gathered) {
      each.values.values.copy(from * each.perRow, count * each.perRow, flat);
      for (const { slot, offset } of each.columns) pick(flat, { offset, every: each.perRow, count }, batch[slot] as Float64Array);
    }
    for (const { slot, inner, values } of axes) spreadAxis(values, inner, { from, count }, batch[slot] as Float64Array);
    onBatch({ rows: count, columns: batch, lines: null });
    onPiece();
  }
  return { columns: found.map((column, slot) => ({ index: indices[slot] ?? 0, significantDigits: arrays[column.array]?.values?.digits() ?? null, isSingle: arrays[column.array]?.members[column.member]?.isSingle })) };
}

function readAxis(arrays: readonly Hdf5Array[], column: ArrayColumn): Float64Array {
  const array = arrays[column.array];
  const { perRow, offset } = placeOf(column, array);
  const flat = new Float64Array(column.rows * perRow);
  array?.values?.values.copy(0, flat.length, flat);
  return flat.filter((_, at) => at % perRow === offset);
}

function gather(arrays: readonly Hdf5Array[], found: readonly ArrayColumn[], indices: readonly number[]): WantedArray[] {
  const byArray = new Map<string, WantedArray>();
  for (const [slot, column] of found.entries()) {
    const array = arrays[column.array];
    if (!array?.values) continue;
    const { perRow, offset } = placeOf(column, array);
    const key = `${column.array} ${perRow}`;
    const known = byArray.get(key) ?? { array, values: array.values, perRow, columns: [] };
    known.columns.push({ slot, offset, index: indices[slot] ?? 0 });
    byArray.set(key, known);
  }
  return [...byArray.values()];
}

/** Numbers that a row takes in the values of its dataset, and which of them is that of the column. */
function placeOf({ elements, element, member }: ArrayColumn, array: Hdf5Array | undefined): { perRow: number; offset: number } {
  const members = array?.members.length ?? 1;
  return { perRow: elements * members, offset: element * members + member };
}

/** Values that are fewer, more or in other lists than the shape says, and those that are no numbers. */
function checkValues({ array, values, perRow, columns }: WantedArray, reasons: ReasonCollector): void {
  const { dims, members } = array;
  const column = (columns[0]?.index ?? 0) + 1;
  const expected = `${elementsOf(dims) * members.length} values in lists of ${dims.join(' × ')}, as its shape says`;
  const isRagged = dims.some((dim, depth) => values.lengths[depth] !== dim && elementsOf(dims) > 0);
  if (values.values.length() !== elementsOf(dims) * members.length) reasons.add({ code: 'column-length', line: null, column, found: `${values.values.length()} values`, expected });
  else if (isRagged) reasons.add({ code: 'column-length', line: null, column, found: `lists of ${values.lengths.map((length) => length ?? 'several lengths').join(' × ')}`, expected });
  else if (values.hasBad()) explainBad({ values, perRow, columns }, reasons);
}

function explainBad({ values, perRow, columns }: Pick<WantedArray, 'values' | 'perRow' | 'columns'>, reasons: ReasonCollector): void {
  const all = values.values.length();
  const some = new Float64Array(mostAtOnce);
  const offsets = new Map(columns.map(({ offset, index }) => [offset, index]));
  for (let from = 0; from < all; from += some.length) {
    const count = Math.min(some.length, all - from);
    values.values.copy(from, count, some);
    for (let i = 0; i < count; i += 1) {
      const index = Number.isNaN(some[i]) ? offsets.get((from + i) % perRow) : undefined;
      if (index === undefined) continue;
      const { line = null, code = 'not-a-number', found = 'no number', expected = 'a number' } = values.bad.get(from + i) ?? {};
      reasons.add({ code, line, column: index + 1, found: `${found} in row ${Math.floor((from + i) / perRow) + 1}`, expected });
    }
  }
}

function pick(flat: Float64Array, { offset, every, count }: { offset: number; every: number; count: number }, into: Float64Array): void {
  for (let row = 0, at = offset; row < count; row += 1, at += every) into[row] = flat[at] as number;
}
