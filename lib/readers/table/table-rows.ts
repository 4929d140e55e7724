import type { TableMemory } from './table-memory';

const slotBytes = 24;

export interface RowsLayout {
  lineEnd: number;
  delimiter: number;
  allowComma: boolean;
  width: number;
  wanted: readonly number[];
  rows: number;
}

export interface TableRows {
  columns: Float64Array[];
  lines: Float64Array;
  /** Most significant digits read so far, per wanted column. */
  significantDigits: () => number[];
}

/** Prepares the compiled reader of rows for one table: the columns lie in its memory and are seen from here as they are. */
export function createTableRows({ code, take, column, powersAt, view: viewOf }: TableMemory, layout: RowsLayout): TableRows {
  const { width, wanted, rows: capacity } = layout;
  const fieldsAt = take(width * 4);
  const slotsAt = take(wanted.length * slotBytes);
  const lines = column(capacity);
  const columns = wanted.map(() => column(capacity));
  const fields = viewOf(fieldsAt, width * 4);
  const slots = viewOf(slotsAt, wanted.length * slotBytes);
  for (const [slot, index] of wanted.entries()) {
    const at = slot * slotBytes;
    fields.setUint32(index * 4, slotsAt + at, true);
    slots.setUint32(at, (columns[slot] as Float64Array).byteOffset, true);
    slots.setBigUint64(at + 16, 1n, true);
  }
  code.describe(layout.lineEnd, layout.delimiter, width, Number(layout.allowComma));
  code.place(powersAt, fieldsAt, slotsAt, wanted.length, lines.byteOffset, capacity);
  return {
    columns, lines,
    significantDigits: () => wanted.map((_, slot) => {
      const at = slot * slotBytes;
      return slots.getUint32(at + 12, true) || slots.getBigUint64(at + 16, true).toString().length - 1;
    }),
  };
}
