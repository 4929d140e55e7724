import { resolveColumn } from '../../domain/columns/resolve-column';
import type { ColumnsAsked, ColumnsFound } from '../column-format';
import { createColumnStore, type ColumnStore } from '../column-store';
import { rejectAtOnce, type ReasonCollector } from '../reason-collector';
import type { ColumnBatch } from '../source';
import { collectArrays } from './collect-arrays';
import { columnsOfArray, ghostNames, isTime, listColumns, type GridColumn } from './grid-columns';
import { arrayKey, type ArrayName, type GridFile } from './grid-file';
import { deliverRows } from './grid-rows';
import { resolveRows } from './resolve-rows';

/** Reads columns of points or cells. Arrays come one after another: what memory does not hold of those asked for waits on disk. */
export async function readVtk(pieces: AsyncIterable<Buffer>, asked: ColumnsAsked): Promise<ColumnsFound> {
  const store = createColumnStore();
  try {
    return await readInto(store, pieces, asked);
  } finally {
    store.close();
  }
}

async function readInto(store: ColumnStore, pieces: AsyncIterable<Buffer>, { wanted, reasons, onBatch, onPiece }: ColumnsAsked): Promise<ColumnsFound> {
  const file = await collectArrays(pieces, { store, reasons, onPiece, firstPieceOnly: false, keep: (array, seen) => (isWanted(array, seen, wanted) ? Infinity : 0) });
  const { columns, indices, of } = resolveRows(listColumns(file), wanted, reasons);
  refuseWords(file, columns, { indices, reasons });
  const deliver = refuseInfinite(columns, { indices, reasons, onBatch });
  const leftOut = deliverRows({
    file, columns, of, most: Infinity,
    refuse: (code, found, expected) => rejectAtOnce(reasons, { code, line: null, column: null, found, expected }),
    onBatch(batch) {
      deliver(batch);
      onPiece();
    },
  });
  reasons.throwIfAny();
  return {
    leftOut,
    columns: columns.map(({ source }, slot) => {
      const array = source.kind === 'array' ? file.arrays.get(arrayKey(source.array)) : undefined;
      return { index: indices[slot] ?? 0, significantDigits: array?.digits ?? null, isSingle: array?.isSingle };
    }),
  };
}

const isAsked = (name: string, wanted: readonly string[]): boolean => wanted.some((each) => resolveColumn([name], each) === 0);

/** Whether an array may be needed, as far as the tags before it tell. */
function isWanted(array: ArrayName, file: GridFile, wanted: readonly string[]): boolean {
  switch (array.section) {
    case 'FieldData': return isTime(array) && isAsked('t', wanted);
    case 'PointData':
    case 'CellData': return ghostNames.includes(array.name) || columnsOfArray(array).some(({ name }) => isAsked(name, wanted));
    case 'Points':
    case 'Coordinates': return true;
    case 'Cells': return !isOfPoints(file, wanted);
  }
}

/** Whether rows can be of points alone: a column asked for is, so that one of cells beside it is rejected. */
function isOfPoints(file: GridFile, wanted: readonly string[]): boolean {
  const columns = listColumns(file);
  const names = columns.map(({ name }) => name);
  return wanted.some((each) => {
    const index = resolveColumn(names, each);
    return typeof index === 'number' && columns[index]?.of === 'points';
  });
}

interface Located { indices: readonly number[]; reasons: ReasonCollector }

/** Reports text in the place of numbers. */
function refuseWords(file: GridFile, columns: readonly GridColumn[], { indices, reasons }: Located): void {
  for (const array of file.arrays.values()) {
    if (array.word === null) continue;
    const slot = columns.findIndex(({ source }) => source.kind === 'array' && arrayKey(source.array) === arrayKey(array));
    const isGeometry = array.section === 'Points' || array.section === 'Coordinates' || array.section === 'Cells';
    if (slot < 0 && !isGeometry) continue;
    reasons.add({
      code: 'not-a-number', line: array.word.line, column: isGeometry ? null : (indices[slot] ?? 0) + 1,
      found: isGeometry ? `${array.word.text} in ${array.name}` : array.word.text, expected: 'a number',
    }, array.word.count);
  }
  reasons.throwIfAny();
}

/** Reports values that are not finite, and hands rows on as long as there are none. */
function refuseInfinite(
  columns: readonly GridColumn[], { indices, reasons, onBatch }: Located & Pick<ColumnsAsked, 'onBatch'>,
): (batch: ColumnBatch) => void {
  let before = 0;
  return (batch) => {
    for (const [slot, { source }] of columns.entries()) {
      const values = (batch.columns[slot] as Float64Array).subarray(0, batch.rows);
      if (isFiniteThroughout(values)) continue;
      const row = values.findIndex((value) => !Number.isFinite(value));
      const of = source.kind === 'geometry' ? `, ${source.what}` : '';
      reasons.add({
        code: 'not-finite', line: null, column: (indices[slot] ?? 0) + 1, found: `${values[row]} in row ${before + row + 1}${of}`, expected: 'a finite number',
      }, values.reduce((count, value) => count + Number(!Number.isFinite(value)), 0));
    }
    before += batch.rows;
    if (reasons.isEmpty()) onBatch(batch);
  };
}

function isFiniteThroughout(values: Float64Array): boolean {
  let sum = 0;
  for (const value of values) sum += value * 0;
  return sum === 0;
}
