import { oneOf, upTo, type Random } from '@/tests/support/random';

const columns = ['x', 'y', 'w', 'u'];
const list = (random: Random, rows: number) => Array.from({ length: rows }, () => (random() - 0.5) * 10 ** upTo(random, 6));

/** JSON as columns of arrays. */
export function anyColumns(random: Random): Buffer {
  const rows = upTo(random, 40);
  const arrays = Object.fromEntries(columns.map((name) => [name, name === 'w' ? list(random, rows).map(() => 1) : list(random, rows)]));
  const document = oneOf(random, [arrays, { columns: arrays }, { meta: { a: [1, [2]] }, ...arrays, n: null }]);
  return Buffer.from(JSON.stringify(document, null, upTo(random, 2)));
}

/** JSON as records. */
export function anyRecords(random: Random): Buffer {
  const records = Array.from({ length: upTo(random, 40) }, () => ({ x: random(), y: random(), w: 1, fields: { u: random(), note: 'a' } }));
  return Buffer.from(JSON.stringify(oneOf<unknown>(random, [records, { rows: records }, { meta: { t: 1 }, data: records }]), null, upTo(random, 2)));
}
