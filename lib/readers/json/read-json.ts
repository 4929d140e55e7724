import { createColumnStore, type ColumnStore } from '../column-store';
import type { ColumnsAsked, ColumnsFound } from '../column-format';
import { createHdf5Document } from '../hdf5-json/hdf5-document';
import { readArrays } from '../hdf5-json/read-arrays';
import { createStoredColumns } from './stored-columns';
import { createJsonDocument } from './json-document';
import { createScalarReader } from './read-scalar';
import { createRecordRows } from './record-rows';

/** Reads columns from JSON. Records are read row by row; of columns that come one after another, what memory does not hold waits on disk. */
export async function readJson(pieces: AsyncIterable<Buffer>, asked: ColumnsAsked): Promise<ColumnsFound> {
  const store = createColumnStore();
  try {
    return await readInto(store, pieces, asked);
  } finally {
    store.close();
  }
}

async function readInto(store: ColumnStore, pieces: AsyncIterable<Buffer>, asked: ColumnsAsked): Promise<ColumnsFound> {
  const reader = createScalarReader();
  const columns = createStoredColumns(store, reader, asked);
  const records = createRecordRows(reader, asked);
  const hdf5 = createHdf5Document({ store, reader, keepsFirst: false }, asked.reasons);
  const document = createJsonDocument({ column: columns.begin, records: records.begin, hdf5: hdf5.member }, asked.reasons);
  for await (const piece of pieces) {
    document.push(piece);
    asked.onPiece();
  }
  document.end();
  switch (document.layout()) {
    case 'records': return records.finish();
    case 'hdf5': return readArrays(hdf5.arrays(), asked);
    case 'columns': return columns.finish(document.header());
  }
}
