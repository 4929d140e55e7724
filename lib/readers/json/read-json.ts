import type { ColumnsAsked, ColumnsFound } from '../column-format';
import { resolveColumn } from '../../domain/columns/resolve-column';
import { createColumnStore, deliverColumns, type ColumnStore, type StoredColumn } from '../column-store';
import { createJsonColumns } from './json-columns';
import { locateColumns } from '../locate-columns';
import { createNumberSink } from './number-sink';

/** Reads columns from JSON, which come one after another: what memory does not hold of them waits on disk. */
export async function readJson(pieces: AsyncIterable<Buffer>, asked: ColumnsAsked): Promise<ColumnsFound> {
  const store = createColumnStore();
  try {
    return await readInto(store, pieces, asked);
  } finally {
    store.close();
  }
}

interface WantedColumn { values: StoredColumn; digits: () => number }

async function readInto(store: ColumnStore, pieces: AsyncIterable<Buffer>, { wanted, reasons, onBatch, onPiece }: ColumnsAsked): Promise<ColumnsFound> {
  const stored = new Map<number, WantedColumn>();
  const columns = createJsonColumns((name, column) => {
    if (!wanted.some((each) => resolveColumn([name], each) === 0)) return null;
    const values = store.addColumn();
    const { sink, digits } = createNumberSink(values, column, reasons);
    stored.set(column - 1, { values, digits });
    return sink;
  }, reasons);
  for await (const piece of pieces) {
    columns.push(piece);
    onPiece();
  }
  columns.end();
  const indices = locateColumns(columns.header(), wanted, 1, reasons);
  const found = indices.flatMap((index) => stored.get(index) ?? []);
  const rows = found[0]?.values.length() ?? 0;
  for (const [slot, { values }] of found.entries()) {
    if (values.length() === rows) continue;
    reasons.add({
      code: 'column-length', line: null, column: (indices[slot] ?? 0) + 1, found: `${values.length()} values`,
      expected: `${rows} values, as in ${wanted[0] ?? 'the first column'}`,
    });
  }
  reasons.throwIfAny();
  deliverColumns(found.map(({ values }) => values), rows, (batch) => {
    onBatch(batch);
    onPiece();
  });
  return { columns: found.map(({ digits }, slot) => ({ index: indices[slot] ?? 0, significantDigits: digits() })) };
}
