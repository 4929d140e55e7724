import type { ColumnsAsked } from '../column-format';
import type { JsonScalar } from './json-structure';
import type { BadValue, ScalarReader } from './read-scalar';

const batchRows = 2048;

/** A scalar as written: `bytes[from, to)`. */
export interface WrittenScalar { kind: JsonScalar; bytes: Buffer; from: number; to: number; line: number }

export interface RecordBatch {
  begin(line: number): void;
  /** A value of the row for a column, which is to come once. */
  put(slot: number, scalar: WrittenScalar): void;
  /** Ends the row; columns without a value are refused. */
  end(): void;
  flush(): void;
  /** The row that is being read, from 1. */
  row(): number;
  digits(slot: number): number;
}

/** Gathers rows into batches. `nameOf` gives the name of a column and its place in the file, from 0. */
export function createRecordBatch(reader: ScalarReader, { wanted, reasons, onBatch }: ColumnsAsked, nameOf: (slot: number) => { name: string; index: number }): RecordBatch {
  const columns = wanted.map(() => new Float64Array(batchRows));
  const digits = wanted.map(() => 0);
  // The row that each column had its last value in.
  const last = wanted.map(() => -1);
  const lines = new Float64Array(batchRows);
  let rows = 0;
  let inBatch = 0;

  const refuse = (slot: number, { found, ...bad }: BadValue, line: number) => {
    reasons.add({ ...bad, found: `${found} in row ${rows + 1}`, line, column: nameOf(slot).index + 1 });
    (columns[slot] as Float64Array)[inBatch] = NaN;
  };
  const flush = () => {
    // What has reasons against it comes to nothing; it is read on for more of them.
    if (inBatch > 0 && reasons.isEmpty()) {
      // A document without line breaks has no lines worth naming; rows are named then.
      const isSpread = (lines[inBatch - 1] as number) > (lines[0] as number);
      onBatch({ rows: inBatch, columns, lines: isSpread ? lines : null });
    }
    inBatch = 0;
  };
  return {
    begin(line) {
      lines[inBatch] = line;
    },
    put(slot, { kind, bytes, from, to, line }) {
      if (last[slot] === rows) reasons.add({ code: 'duplicate-column', line, column: null, found: `row ${rows + 1}`, expected: `one ${nameOf(slot).name}` });
      last[slot] = rows;
      const value = reader.read(kind, bytes, from, to);
      if (Number.isNaN(value)) refuse(slot, reader.explain(kind, bytes, from, to), line);
      else {
        (columns[slot] as Float64Array)[inBatch] = value;
        if (reader.digits() > (digits[slot] as number)) digits[slot] = reader.digits();
      }
    },
    end() {
      for (let slot = 0; slot < last.length; slot += 1) {
        if (last[slot] !== rows) refuse(slot, { code: 'missing-value', found: `no ${nameOf(slot).name}`, expected: 'a number' }, lines[inBatch] as number);
      }
      rows += 1;
      inBatch += 1;
      if (inBatch === batchRows) flush();
    },
    flush,
    row: () => rows + 1,
    digits: (slot) => digits[slot] as number,
  };
}
