import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = path.join(import.meta.dirname, '..');
const checks = ['grid-convergence', 'least-squares', 'outcomes', 'plate-with-hole', 'published-orders', 'space-time'];

/** The tests that mutated numerics are run against; those that take minutes are left out. */
export default defineConfig({
  resolve: { alias: { '@': root } },
  test: {
    root, include: ['tests/unit/numerics/**/*.test.ts', ...checks.map((name) => `tests/checks/${name}.test.ts`)],
    exclude: ['**/*.properties.test.ts', '**/expression/**', '**/mesh/**', '**/compensated-sum.test.ts'],
    testTimeout: 30_000,
  },
});
