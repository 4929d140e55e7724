import type { ColumnsPreview } from '../column-format';
import { createColumnStore } from '../column-store';
import { createHdf5Document } from '../hdf5-json/hdf5-document';
import { previewArrays } from '../hdf5-json/read-arrays';
import { createReasonCollector } from '../reason-collector';
import type { ColumnSink } from './column-arrays';
import { createJsonDocument } from './json-document';
import { createScalarReader } from './read-scalar';
import type { RecordSink } from './record-lists';

const shownRows = 10;
/** A value is shown so far, in bytes. */
const shownBytes = 200;
const show = (bytes: Buffer, from: number, to: number) => bytes.toString('utf8', from, Math.min(to, from + shownBytes));

const longestOf = (lists: readonly RecordPreview[]) => lists.reduce((longest, list) => (list.rows() > longest.rows() ? list : longest));

/** The columns of JSON and their first rows. All of it is read but for a list of records, since columns stand one after another. */
export async function previewJson(pieces: AsyncIterable<Buffer>): Promise<ColumnsPreview> {
  const reasons = createReasonCollector();
  const store = createColumnStore();
  try {
    const first: string[][] = [];
    const lists: RecordPreview[] = [];
    const hdf5 = createHdf5Document({ store, reader: createScalarReader(), keepsFirst: true }, reasons);
    const document = createJsonDocument({
      column: () => previewColumn(first),
      records() {
        const list = createRecordPreview();
        lists.push(list);
        return list.sink;
      },
      hdf5: hdf5.member,
    }, reasons);
    for await (const piece of pieces) {
      document.push(piece);
      if (document.isList() && (lists[0]?.rows() ?? 0) >= shownRows) return longestOf(lists).preview();
    }
    document.end();
    switch (document.layout()) {
      case 'hdf5': return previewArrays(hdf5.arrays());
      case 'records': return longestOf(lists).preview();
      case 'columns': return previewOf([...document.header()], first);
    }
  } finally {
    store.close();
  }
}

function previewOf(header: string[], first: readonly string[][]): ColumnsPreview {
  const rows = first.reduce((most, values) => Math.max(most, values.length), 0);
  const firstRows = Array.from({ length: rows }, (_, row) => header.map((_name, column) => first[column]?.[row] ?? ''));
  return { delimiter: null, hasHeader: true, header, firstRows };
}

function previewColumn(first: string[][]): ColumnSink {
  const values: string[] = [];
  first.push(values);
  return {
    scalar(_kind, bytes, from, to) {
      if (values.length < shownRows) values.push(show(bytes, from, to));
    },
    nested() {
      if (values.length < shownRows) values.push('[ … ]');
    },
  };
}

interface RecordPreview { sink: RecordSink; rows(): number; preview(): ColumnsPreview }

/** The names of the first record of a list are its columns. */
function createRecordPreview(): RecordPreview {
  const header: string[] = [];
  const places = new Map<string, number>();
  const first: string[][] = [];
  let rows = 0;
  return {
    rows: () => rows,
    preview: () => previewOf(header, first),
    sink: {
      begin: () => undefined,
      value(path, _kind, bytes, from, to) {
        if (rows >= shownRows) return;
        if (rows === 0 && !places.has(path)) {
          places.set(path, header.push(path) - 1);
          first.push([]);
        }
        const column = places.get(path);
        if (column !== undefined) (first[column] as string[])[rows] = show(bytes, from, to);
      },
      end() {
        rows += 1;
      },
      other: () => undefined,
    },
  };
}
