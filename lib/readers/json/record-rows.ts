import type { ColumnsAsked, ColumnsFound } from '../column-format';
import { resolveColumn } from '../../domain/columns/resolve-column';
import { locateColumns } from '../locate-columns';
import type { JsonScalar } from './json-structure';
import type { BadValue, ScalarReader } from './read-scalar';
import type { RecordSink } from './record-lists';

const batchRows = 2048;

interface FirstValue { kind: JsonScalar; bytes: Buffer; line: number }

export interface RecordRows {
  /** A list of records begins. */
  begin: () => RecordSink;
  finish(): ColumnsFound;
}

/**
 * Reads records as rows, in batches as they come. The names of the first record of a list are the columns; a list whose
 * first record has not all that is wanted is passed over.
 */
export function createRecordRows(reader: ScalarReader, { wanted, reasons, onBatch }: ColumnsAsked): RecordRows {
  let passed: string[] | null = null;
  let indices: number[] | null = null;
  const digits = wanted.map(() => 0);
  const columns = wanted.map(() => new Float64Array(batchRows));
  const lines = new Float64Array(batchRows);
  let rows = 0;
  let inBatch = 0;

  const flush = () => {
    if (inBatch === 0 || !reasons.isEmpty()) return;
    // A document without line breaks has no lines worth naming; rows are named then.
    const isSpread = (lines[inBatch - 1] as number) > (lines[0] as number);
    onBatch({ rows: inBatch, columns, lines: isSpread ? lines : null });
  };

  const begin = (): RecordSink => {
    if (indices !== null) return ignored;
    const header: string[] = [];
    const first: FirstValue[] = [];
    // Where each name of the first record goes, once that is known.
    let slots: number[][] | null = null;
    let places: Map<string, number> | null = null;
    const seen: number[] = [];
    let own: number[] = [];
    let next = 0;
    let isPassed = false;

    const refuse = (slot: number, { found, ...bad }: BadValue, line: number) => {
      reasons.add({ ...bad, found: `${found} in row ${rows + 1}`, line, column: (own[slot] ?? 0) + 1 });
      (columns[slot] as Float64Array)[inBatch] = NaN;
    };
    const put = (at: number, { kind, bytes, from, to, line }: { kind: JsonScalar; bytes: Buffer; from: number; to: number; line: number }) => {
      for (const slot of slots?.[at] ?? []) {
        if (seen[slot] === rows) reasons.add({ code: 'duplicate-column', line, column: null, found: `row ${rows + 1}`, expected: `one ${header[at]}` });
        seen[slot] = rows;
        const value = reader.read(kind, bytes, from, to);
        if (Number.isNaN(value)) refuse(slot, reader.explain(kind, bytes, from, to), line);
        else {
          (columns[slot] as Float64Array)[inBatch] = value;
          if (reader.digits() > (digits[slot] as number)) digits[slot] = reader.digits();
        }
      }
    };
    const settle = () => {
      if (wanted.some((name) => resolveColumn(header, name) === 'absent')) {
        passed ??= header;
        isPassed = true;
        return;
      }
      own = locateColumns(header, wanted, first[0]?.line ?? 1, reasons);
      indices = own;
      slots = header.map((_, at) => own.flatMap((index, slot) => (index === at ? [slot] : [])));
      places = new Map(header.map((name, at) => [name, at]));
      for (const [at, { kind, bytes, line }] of first.entries()) put(at, { kind, bytes, from: 0, to: bytes.length, line });
    };
    return {
      begin(line) {
        lines[inBatch] = line;
        next = 0;
      },
      value(path, kind, bytes, from, to, line) {
        if (isPassed) return;
        if (places === null) {
          header.push(path);
          first.push({ kind, bytes: Buffer.from(bytes.subarray(from, to)), line });
          return;
        }
        const at = header[next] === path ? next : places.get(path);
        if (at === undefined) return;
        next = at + 1;
        put(at, { kind, bytes, from, to, line });
      },
      end() {
        if (isPassed) return;
        if (slots === null) settle();
        if (isPassed) return;
        for (const [slot, index] of own.entries()) {
          if (seen[slot] !== rows) refuse(slot, { code: 'missing-value', found: `no ${header[index]}`, expected: 'a number' }, lines[inBatch] as number);
        }
        rows += 1;
        inBatch += 1;
        if (inBatch < batchRows) return;
        flush();
        inBatch = 0;
      },
      other(line) {
        if (!isPassed) reasons.add({ code: 'not-a-number', line, column: null, found: `something else than a record in row ${rows + 1}`, expected: 'a record with the names of the first' });
      },
    };
  };
  return {
    begin,
    finish() {
      if (indices === null) locateColumns(passed ?? [], wanted, null, reasons);
      flush();
      return { columns: (indices ?? []).map((index, slot) => ({ index, significantDigits: digits[slot] ?? 0 })) };
    },
  };
}

const nothing = () => undefined;
const ignored: RecordSink = { begin: nothing, value: nothing, end: nothing, other: nothing };
