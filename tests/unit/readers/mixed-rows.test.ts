import { describe, expect, it } from 'vitest';
import { createGridChecks } from '@/lib/readers/grid-checks';
import { createChunkReader } from '@/lib/readers/table/read-chunk';
import type { TableDialect } from '@/lib/readers/table/table-dialect';
import { seeded } from '@/tests/support/random';

const random = seeded(20_261_202);
const pick = <T>(items: readonly T[]): T => items[Math.floor(random() * items.length)] as T;
const digits = (count: number) => Array.from({ length: count }, () => Math.floor(random() * 10)).join('');

const shapes: readonly (() => string)[] = [
  () => String(random()),
  () => `${random() < 0.5 ? '-' : ''}${digits(1 + Math.floor(random() * 9))}.${digits(Math.floor(random() * 20))}`,
  () => `-.${digits(1 + Math.floor(random() * 18))}`,
  () => digits(1 + Math.floor(random() * 22)),
  () => `+${random()}`,
  () => `${(random() - 0.5) * 10 ** (random() * 600 - 300)}`,
  () => `${digits(1)}.${digits(16)}E${Math.floor(random() * 40) - 20}`,
  () => `0.000${digits(17)}`,
  () => pick(['0', '-0', '0.0', '1', '1e0', '1.', '2.44140625e-07', '9007199254740993', '-00012.50']),
];
const anyNumber = () => pick(shapes)();

/** A row in one of the ways in which rows are written; `text` is a column that nobody asks for. */
const styles: readonly ((cells: string[], text: string) => string)[] = [
  ([a, b, c], text) => `${a},${b},${text},${c}`,
  ([a, b, c], text) => `${a},${b},${text},${c}\r`,
  ([a, b, c], text) => `  ${a} , ${b},${text},${c} `,
  ([a, b, c], text) => `"${a}",${b},${text},${c}`,
  ([a, b, c], text) => `${a},${b},"${text}, more",${c}`,
  ([a, b, c], text) => `${a},${b},${text},${c},`,
];
const dialect: TableDialect = {
  delimiter: 'comma', hasHeader: true, header: ['a', 'b', 'text', 'c'], headerLine: 1, lineEnd: 10, linesBefore: 0, firstRows: [],
};

describe.each([
  { name: 'now and then of another kind', plain: 0.95 }, { name: 'mostly of another kind', plain: 0.1 }, { name: 'all plain', plain: 1 },
])('rows $name', ({ plain }) => {
  it('are read as the language reads their numbers, each with its line', () => {
    const rows: string[][] = [];
    const lines: string[] = [];
    const places: number[] = [];
    while (rows.length < 9000) {
      const above = rows.at(-1);
      const cells = [0, 1, 2].map((column) => (above !== undefined && random() < 0.4 ? above[column] as string : anyNumber()));
      if (random() < 0.01) lines.push(pick(['', '# 1,2,3', '  ', '\r']));
      rows.push(cells);
      places.push(lines.push((random() < plain ? styles[0] as (typeof styles)[number] : pick(styles))(cells, pick(['7', 'wall', '', '1.5e3']))));
    }
    const reader = createChunkReader({ dialect, wanted: [0, 1, 3] });
    const checks = createGridChecks(undefined);
    const read: number[][] = [];
    const readLines: number[] = [];
    reader.read(Buffer.from(`${lines.join('\n')}\n`), { line: 0, skipped: 0, mark: null }, checks.rows, (batch) => {
      for (let row = 0; row < batch.rows; row += 1) {
        read.push(batch.columns.map((column) => column[row] as number));
        readLines.push(batch.lines?.[row] as number);
      }
    });
    checks.throwIfAny(undefined);
    expect(readLines).toEqual(places);
    const wrong = rows.findIndex((cells, row) => cells.some((cell, column) => !Object.is(Number(cell), read[row]?.[column])));
    expect(wrong < 0 ? null : { written: rows[wrong], read: read[wrong], line: lines[(places[wrong] as number) - 1] }).toBeNull();
  });
});
