import { explainRow, type RowRules } from './explain-row';
import { parseNumber, type NumberReading } from './parse-number';
import { longestLine } from './read-head';
import { rejectAtOnce, type ReasonCollector } from './reason-collector';
import { delimiterCharacter } from './split-fields';
import type { ColumnBatch } from './source';
import type { TableDialect } from './table-dialect';

const batchRows = 2048;

export interface TableParserOptions {
  dialect: TableDialect;
  /** Indices of the columns to deliver, in that order, each once. */
  wanted: readonly number[];
  reasons: ReasonCollector;
  onBatch: (batch: ColumnBatch) => void;
}

export interface TableParser {
  push(chunk: Buffer): void;
  end(): void;
  rows(): number;
  significantDigits(): number[];
}

/**
 * Turns the bytes of a text table into batches of columns, wherever the bytes are cut. A row with anything wrong in it is
 * left out of the batches and explained to the collector; numbers are read in place, without a string per value.
 */
export function createTableParser({ dialect, wanted, reasons, onBatch }: TableParserOptions): TableParser {
  const newline = dialect.lineEnd;
  const width = dialect.header.length;
  const isSpaced = dialect.delimiter === 'white space';
  const delimiter = dialect.delimiter === 'white space' ? 32 : delimiterCharacter[dialect.delimiter].charCodeAt(0);
  const allowComma = dialect.delimiter !== 'comma';
  const digits = wanted.map(() => 0);
  const rules: RowRules = { delimiter: dialect.delimiter, width, wanted, allowComma, digits, mark: null, reasons };
  const slotOf = new Int32Array(width).fill(-1);
  for (const [slot, index] of wanted.entries()) slotOf[index] = slot;

  const columns = wanted.map(() => new Float64Array(batchRows));
  const lines = new Float64Array(batchRows);
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  let carry: Buffer[] = [];
  let carried = 0;
  let line = 0;
  let rows = 0;
  let delivered = 0;

  const flush = () => {
    if (rows > 0) onBatch({ rows, columns, lines });
    delivered += rows;
    rows = 0;
  };

  /** Reads the value in bytes[from, to) into its column; false where it is not plainly a number. */
  const readValue = (bytes: Buffer, from: number, to: number, slot: number): boolean => {
    const value = parseNumber(bytes, from, to, allowComma, reading);
    if (reading.status !== 'number') return false;
    if (reading.mark !== 'none') {
      rules.mark ??= { mark: reading.mark, line };
      if (reading.mark !== rules.mark.mark) return false;
    }
    (columns[slot] as Float64Array)[rows] = value;
    if (reading.digits > (digits[slot] as number)) digits[slot] = reading.digits;
    return true;
  };

  /** Whether the whole row was plain numbers. */
  const readRow = (bytes: Buffer, start: number, end: number): boolean => {
    let field = 0;
    let at = start;
    for (;;) {
      let stop = at;
      if (isSpaced) while (stop < end && !isBlank(bytes[stop] as number)) stop += 1;
      else while (stop < end && bytes[stop] !== delimiter) stop += 1;
      const slot = field < width ? (slotOf[field] as number) : -1;
      if (slot >= 0) {
        let to = stop;
        while (at < to && isBlank(bytes[at] as number)) at += 1;
        while (to > at && isBlank(bytes[to - 1] as number)) to -= 1;
        if (!readValue(bytes, at, to, slot)) return false;
      } else if (bytes[at] === 34) return false;
      field += 1;
      // A separator may end the row.
      if (stop >= end) return field === width || (field === width + 1 && at === stop);
      at = stop + 1;
      if (isSpaced) while (at < end && isBlank(bytes[at] as number)) at += 1;
    }
  };

  const readLine = (bytes: Buffer, from: number, to: number) => {
    line += 1;
    if (line <= dialect.linesBefore) return;
    let start = from;
    let end = to;
    while (end > start && isEndSpace(bytes[end - 1] as number, isSpaced)) end -= 1;
    let first = start;
    while (first < end && isBlank(bytes[first] as number)) first += 1;
    if (first === end || isComment(bytes, first, end)) return;
    if (isSpaced) start = first;
    if (!readRow(bytes, start, end) && !explainRow(rules, bytes, start, end, line, columns, rows)) return;
    lines[rows] = line;
    rows += 1;
    if (rows === batchRows) flush();
  };

  return {
    push(chunk) {
      let at = 0;
      if (carried > 0) {
        const stop = chunk.indexOf(newline);
        // Copies here and below: the source may use its buffer again.
        carry.push(Buffer.from(stop < 0 ? chunk : chunk.subarray(0, stop)));
        carried += stop < 0 ? chunk.length : stop;
        checkLength(carried, line, reasons);
        if (stop < 0) return;
        const joined = Buffer.concat(carry, carried);
        readLine(joined, 0, joined.length);
        carry = [];
        carried = 0;
        at = stop + 1;
      }
      for (let stop = chunk.indexOf(newline, at); stop >= 0; stop = chunk.indexOf(newline, at)) {
        readLine(chunk, at, stop);
        at = stop + 1;
      }
      if (at < chunk.length) {
        carried = chunk.length - at;
        checkLength(carried, line, reasons);
        carry.push(Buffer.from(chunk.subarray(at)));
      }
    },
    end() {
      if (carried > 0) readLine(Buffer.concat(carry, carried), 0, carried);
      flush();
    },
    rows: () => delivered + rows,
    significantDigits: () => [...digits],
  };
}

function isBlank(byte: number): boolean {
  return byte === 32 || byte === 9 || byte === 13;
}

/** A tab at the end of a line may part an empty column, unless any white space parts columns. */
function isEndSpace(byte: number, isSpaced: boolean): boolean {
  return byte === 32 || byte === 13 || (isSpaced && byte === 9);
}

function isComment(bytes: Buffer, at: number, end: number): boolean {
  const byte = bytes[at];
  return byte === 35 || byte === 37 || byte === 33 || (byte === 47 && at + 1 < end && bytes[at + 1] === 47);
}

function checkLength(length: number, line: number, reasons: ReasonCollector): void {
  if (length <= longestLine) return;
  rejectAtOnce(reasons, {
    code: 'line-too-long', line: line + 1, column: null, found: `more than ${longestLine} bytes in one line`, expected: 'lines of at most 1 MiB',
  });
}
