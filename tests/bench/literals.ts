import { findWrongLiteral } from '@/tests/support/literals';

const count = Number(process.argv[2] ?? 10_000_000);
const start = performance.now();
const { read, wrong } = findWrongLiteral(count, Number(process.argv[3] ?? Date.now() % 2 ** 31));
console.log(wrong ?? `${read} literals read bit for bit as the language reads them, in ${((performance.now() - start) / 1000).toFixed(0)} s`);
process.exit(wrong === null ? 0 : 1);
