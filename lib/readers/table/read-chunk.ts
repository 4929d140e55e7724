import { explainRow, type DecimalMark, type RowRules } from './explain-row';
import type { ReasonCollector } from '../reason-collector';
import { delimiterCharacter } from './split-fields';
import type { ColumnBatch } from '../source';
import type { TableDialect } from './table-dialect';
import { roomBytes } from './table-chunks';
import { createTableMemory, type TableMemory } from './table-memory';
import { createTableRows } from './table-rows';

const batchRows = 2048;
const marks = [null, 'point', 'comma'] as const;
const full = 1;
const stopped = 2;

export interface ChunkReaderOptions {
  dialect: TableDialect;
  /** Indices of the columns to deliver, in that order, each once. */
  wanted: readonly number[];
  /** Where rows are read; chunks that lie there already are not copied. */
  memory?: TableMemory;
}

/** What went before a chunk, as far as its lines and numbers depend on it. */
export interface ChunkStart {
  /** Lines before it. */
  line: number;
  /** Lines of the file to pass over. */
  skipped: number;
  mark: DecimalMark | null;
}

export interface ChunkEnd {
  /** Lines up to its end. */
  line: number;
  mark: DecimalMark | null;
}

export interface ChunkReader {
  /** Reads whole lines, the last one ended too. What is wrong with a row goes to `reasons`; the row is then left out. */
  read(bytes: Uint8Array, start: ChunkStart, reasons: ReasonCollector, onBatch: (batch: ColumnBatch) => void): ChunkEnd;
  /** Most significant digits read so far, per wanted column. */
  significantDigits(): number[];
}

/** Turns lines of a text table into batches of columns; a row that is not plainly numbers is looked at again by explainRow. */
export function createChunkReader({ dialect, wanted, memory = createTableMemory() }: ChunkReaderOptions): ChunkReader {
  const allowComma = dialect.delimiter !== 'comma';
  const delimiter = dialect.delimiter === 'white space' ? 32 : delimiterCharacter[dialect.delimiter].charCodeAt(0);
  const width = dialect.header.length;
  const { columns, lines, significantDigits } = createTableRows(memory, { lineEnd: dialect.lineEnd, delimiter, allowComma, width, wanted, rows: batchRows });
  const rows = memory.code;
  let ownRoom: number | null = null;
  const digits = wanted.map(() => 0);
  const given: DecimalMark | null = dialect.decimalMark === undefined ? null : { mark: dialect.decimalMark, line: 0 };
  const numberAt = (global: WebAssembly.Global) => global.value as number;

  const readMark = (known: DecimalMark | null): DecimalMark | null => {
    const mark = marks[numberAt(rows.fileMark)];
    return known ?? (mark ? { mark, line: numberAt(rows.markLine) } : null);
  };

  /** Whether the row that stopped the reading is one after all. */
  const readStopped = (rules: RowRules): boolean => {
    rules.mark = readMark(rules.mark);
    const start = numberAt(rows.rowStart);
    const bytes = memory.bytes(start, numberAt(rows.at) - 1 - start);
    const end = trimEnd(bytes, bytes.length, dialect.delimiter === 'white space');
    const isRow = explainRow(rules, { bytes, start: 0, end, line: numberAt(rows.line) }, columns, numberAt(rows.row));
    if (rules.mark !== null) rows.fileMark.value = marks.indexOf(rules.mark.mark);
    return isRow;
  };

  const copyIn = (bytes: Uint8Array): number => {
    ownRoom ??= memory.take(roomBytes);
    memory.bytes(ownRoom, bytes.length).set(bytes);
    return ownRoom;
  };

  return {
    read(bytes, start, reasons, onBatch) {
      const at = memory.addressOf(bytes) ?? copyIn(bytes);
      const known = start.mark ?? given;
      rows.begin(at, start.line, known === null ? 0 : marks.indexOf(known.mark));
      const rules: RowRules = { delimiter: dialect.delimiter, width, wanted, allowComma, digits, mark: known, isMarkGiven: given !== null, reasons };
      for (;;) {
        const state = rows.readRows(at + bytes.length, start.skipped);
        const row = numberAt(rows.row);
        if (state === stopped) {
          if (!readStopped(rules)) continue;
          lines[row] = numberAt(rows.line);
          rows.goOn(row + 1);
          continue;
        }
        if (row > 0) onBatch({ rows: row, columns, lines });
        if (state !== full) return { line: numberAt(rows.line), mark: readMark(rules.mark) };
        rows.goOn(0);
      }
    },
    significantDigits: () => significantDigits().map((most, slot) => Math.max(most, digits[slot] ?? 0)),
  };
}

/** Leaves out white space at the end. A tab there may part an empty column, unless any white space parts columns. */
function trimEnd(bytes: Buffer, end: number, isSpaced: boolean): number {
  while (end > 0 && (bytes[end - 1] === 32 || bytes[end - 1] === 13 || (isSpaced && bytes[end - 1] === 9))) end -= 1;
  return end;
}
