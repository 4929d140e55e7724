import type { ColumnsAsked, ColumnsFound } from '../column-format';
import { resolveColumn } from '../../domain/columns/resolve-column';
import { locateColumns } from '../locate-columns';
import type { ScalarReader } from './read-scalar';
import { createRecordBatch, type WrittenScalar } from './record-batch';
import type { RecordSink } from './record-lists';

export interface RecordRows {
  /** A list of records begins. */
  begin: () => RecordSink;
  finish(): ColumnsFound;
}

/** The names of the first record of a list, and where their values go. */
interface Columns {
  header: readonly string[];
  places: ReadonlyMap<string, number>;
  /** The slots of the columns wanted that each name is. */
  slots: readonly (readonly number[])[];
  /** The column of each slot. */
  indices: readonly number[];
}

/**
 * Reads records as rows, in batches as they come. The names of the first record of a list are the columns; a list whose
 * first record has not all that is wanted is passed over.
 */
export function createRecordRows(reader: ScalarReader, asked: ColumnsAsked): RecordRows {
  const { wanted, reasons } = asked;
  let passed: readonly string[] | null = null;
  let columns: Columns | null = null;
  const batch = createRecordBatch(reader, asked, (slot) => {
    const index = columns?.indices[slot] ?? 0;
    return { name: columns?.header[index] ?? '', index };
  });

  /** The columns of a list by its first record; null where it is not the one that is wanted. */
  const settle = (header: readonly string[], line: number): Columns | null => {
    if (wanted.some((name) => resolveColumn(header, name) === 'absent')) {
      passed ??= header;
      return null;
    }
    const indices = locateColumns(header, wanted, line, reasons);
    return { header, places: new Map(header.map((name, at) => [name, at])), slots: header.map((_, at) => indices.flatMap((index, slot) => (index === at ? [slot] : []))), indices };
  };
  const put = (own: Columns, at: number, scalar: WrittenScalar) => {
    for (const slot of own.slots[at] ?? []) batch.put(slot, scalar);
  };

  const begin = (): RecordSink => {
    if (columns !== null) return ignored;
    const header: string[] = [];
    const first: WrittenScalar[] = [];
    let own: Columns | null = null;
    let isPassed = false;
    // Records mostly have their names in one order.
    let next = 0;
    const endFirst = () => {
      own = columns = settle(header, first[0]?.line ?? 1);
      isPassed = own === null;
      if (own !== null) for (const [at, scalar] of first.entries()) put(own, at, scalar);
    };
    return {
      begin(line) {
        next = 0;
        if (!isPassed) batch.begin(line);
      },
      value(path, kind, bytes, from, to, line) {
        if (isPassed) return;
        if (own === null) {
          header.push(path);
          first.push({ kind, bytes: Buffer.from(bytes.subarray(from, to)), from: 0, to: to - from, line });
          return;
        }
        const at = own.header[next] === path ? next : own.places.get(path);
        if (at === undefined) return;
        next = at + 1;
        put(own, at, { kind, bytes, from, to, line });
      },
      end() {
        if (!isPassed && own === null) endFirst();
        if (!isPassed) batch.end();
      },
      other(line) {
        if (isPassed) return;
        reasons.add({ code: 'not-a-number', line, column: null, found: `something else than a record in row ${batch.row()}`, expected: 'a record with the names of the first' });
      },
    };
  };
  return {
    begin,
    finish() {
      if (columns === null) locateColumns(passed ?? [], wanted, null, reasons);
      batch.flush();
      return { columns: (columns?.indices ?? []).map((index, slot) => ({ index, significantDigits: batch.digits(slot) })) };
    },
  };
}

const nothing = () => undefined;
const ignored: RecordSink = { begin: nothing, value: nothing, end: nothing, other: nothing };
