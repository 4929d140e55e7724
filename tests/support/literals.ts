import { createGridChecks } from '@/lib/readers/grid-checks';
import { createChunkReader } from '@/lib/readers/table/read-chunk';
import type { TableDialect } from '@/lib/readers/table/table-dialect';
import { seeded, upTo, type Random } from './random';

const digits = (random: Random, count: number) => Array.from({ length: count }, () => upTo(random, 9)).join('');

function anyDouble(random: Random): number {
  const view = new DataView(new ArrayBuffer(8));
  view.setUint32(0, upTo(random, 2 ** 32 - 1));
  view.setUint32(4, upTo(random, 2 ** 32 - 1));
  return view.getFloat64(0);
}

/** Exactly between two doubles, or a hair beside it. */
function halfway(random: Random): string {
  const odd = (BigInt(2 ** 52 + upTo(random, 2 ** 52 - 1)) * 2n) + 1n;
  const exact = (odd << BigInt(upTo(random, random() < 0.7 ? 8 : 300))).toString();
  const beside = ['', '.', '.0', `.${'0'.repeat(upTo(random, 30))}1`][upTo(random, 3)] ?? '';
  return random() < 0.2 ? (BigInt(exact) - 1n).toString() : exact + beside;
}

const shapes: readonly ((random: Random) => string)[] = [
  (random) => anyDouble(random).toExponential(16),
  (random) => anyDouble(random).toExponential(upTo(random, 20)),
  (random) => String(anyDouble(random)),
  (random) => String(random()),
  (random) => (random() * 10 ** upTo(random, 6)).toPrecision(17),
  (random) => (random() * 10 ** upTo(random, 6)).toFixed(upTo(random, 25)),
  (random) => `${digits(random, upTo(random, 24))}.${digits(random, 1 + upTo(random, 24))}e${upTo(random, 660) - 345}`,
  (random) => `${digits(random, 1 + upTo(random, 21))}E${upTo(random, 40) - 20}`,
  (random) => `${digits(random, 17)}e${upTo(random, 30) - 345}`,
  (random) => `1.79769313486231${digits(random, upTo(random, 8))}e308`,
  (random) => `${['2.2250738585072', '4.9406564584124', '2.4703282292062'][upTo(random, 2)]}${digits(random, upTo(random, 12))}e-3${['08', '24', '24'][upTo(random, 2)]}`,
  halfway,
];

/** A literal of a finite number, in one of many shapes, some made to be rounded wrong. */
function literal(random: Random): string {
  for (;;) {
    const text = (shapes[upTo(random, shapes.length - 1)] as (random: Random) => string)(random);
    if (Number.isFinite(Number(text))) return text;
  }
}

const dialect: TableDialect = {
  delimiter: 'semicolon', hasHeader: true, header: ['q'], headerLine: 1, lineEnd: 10, linesBefore: 0, firstRows: [],
};
const atOnce = 4000;

/**
 * Reads literals as rows of a table and compares each value, bit by bit, with what the language makes of it; a fifth is
 * written with Fortran's D, a tenth stands twice on end. The first that differs is named.
 */
export function findWrongLiteral(count: number, seed: number): { read: number; wrong: string | null } {
  const random = seeded(seed);
  const checks = createGridChecks(undefined);
  const reader = createChunkReader({ dialect, wanted: [0] });
  let read = 0;
  while (read < count) {
    const texts: string[] = [];
    while (texts.length < atOnce) {
      const text = random() < 0.5 ? `-${literal(random).replace('-', '')}` : literal(random);
      if (!Number.isFinite(Number(text))) continue;
      texts.push(text);
      if (random() < 0.1) texts.push(text);
    }
    const written = texts.map((text) => (random() < 0.2 ? text.replace(/e/i, 'D') : text));
    const values: number[] = [];
    reader.read(Buffer.from(`${written.join('\n')}\n`), { line: 0, skipped: 0, mark: null }, checks.rows, ({ rows, columns }) => {
      values.push(...(columns[0] as Float64Array).subarray(0, rows));
    });
    checks.throwIfAny(undefined);
    const at = texts.findIndex((text, index) => !Object.is(Number(text), values[index]));
    if (at >= 0 || values.length !== texts.length) return { read, wrong: `${written[at]} was read as ${values[at]}` };
    read += texts.length;
  }
  return { read, wrong: null };
}
