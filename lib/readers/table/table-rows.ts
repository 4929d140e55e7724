import { powersOfFive } from '../powers-of-five';
import { tableRowsModule } from './table-rows.generated';

/** What table-rows/read-rows.ts exports, which says what each does. */
interface RowsExports {
  freeFrom(): number;
  describe(lineEnd: number, separator: number, columns: number, takesComma: number): void;
  place(powers: number, fields: number, slots: number, count: number, lines: number, rows: number): void;
  begin(from: number, lineBefore: number, knownMark: number): void;
  goOn(rows: number): void;
  readRows(end: number, skipped: number): number;
  row: WebAssembly.Global;
  line: WebAssembly.Global;
  at: WebAssembly.Global;
  rowStart: WebAssembly.Global;
  fileMark: WebAssembly.Global;
  markLine: WebAssembly.Global;
}

const pageBytes = 65_536;
const slotBytes = 24;
/** Numbers are looked at eight bytes at a time, past the end of the last. */
const margin = 64;

let compiled: WebAssembly.Module | null = null;

export interface RowsLayout {
  lineEnd: number;
  delimiter: number;
  allowComma: boolean;
  width: number;
  wanted: readonly number[];
  rows: number;
  /** The most bytes that are read at once. */
  bytes: number;
}

export interface TableRows {
  rows: RowsExports;
  /** Where bytes to be read are put, and where that is. */
  input: Buffer;
  inputAt: number;
  columns: Float64Array[];
  lines: Float64Array;
  /** Most significant digits read so far, per wanted column. */
  significantDigits(): number[];
}

/** Prepares the compiled reader of rows for one table: its memory holds the columns, which are seen from here as they are. */
export function createTableRows(layout: RowsLayout): TableRows {
  const { width, wanted, rows: capacity } = layout;
  compiled ??= new WebAssembly.Module(Buffer.from(tableRowsModule, 'base64'));
  const memory = new WebAssembly.Memory({ initial: 1 });
  const rows = new WebAssembly.Instance(compiled, { env: { memory } }).exports as unknown as RowsExports;
  let end = rows.freeFrom();
  const take = (bytes: number) => {
    const at = Math.ceil(end / 8) * 8;
    end = at + bytes;
    return at;
  };
  const powers = powersOfFive();
  const powersAt = take(powers.length);
  const fieldsAt = take(width * 4);
  const slotsAt = take(wanted.length * slotBytes);
  const linesAt = take(capacity * 8);
  const valuesAt = wanted.map(() => take(capacity * 8));
  const inputAt = take(layout.bytes + margin);
  memory.grow(Math.ceil(end / pageBytes) - 1);
  const view = new DataView(memory.buffer);
  new Uint8Array(memory.buffer).set(powers, powersAt);
  for (const [slot, index] of wanted.entries()) {
    const at = slotsAt + slot * slotBytes;
    view.setUint32(fieldsAt + index * 4, at, true);
    view.setUint32(at, valuesAt[slot] as number, true);
    view.setBigUint64(at + 16, 1n, true);
  }
  rows.describe(layout.lineEnd, layout.delimiter, width, Number(layout.allowComma));
  rows.place(powersAt, fieldsAt, slotsAt, wanted.length, linesAt, capacity);
  return {
    rows, inputAt, input: Buffer.from(memory.buffer, inputAt, layout.bytes + margin),
    columns: valuesAt.map((at) => new Float64Array(memory.buffer, at, capacity)),
    lines: new Float64Array(memory.buffer, linesAt, capacity),
    significantDigits: () => wanted.map((_, slot) => {
      const at = slotsAt + slot * slotBytes;
      return view.getUint32(at + 12, true) || view.getBigUint64(at + 16, true).toString().length - 1;
    }),
  };
}
