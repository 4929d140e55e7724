import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = path.join(import.meta.dirname, '../..');

/** One file of any size through the real page; apart from the suite, since it takes minutes and gigabytes. */
export default defineConfig({
  root,
  resolve: { alias: { '@': root, 'server-only': `${root}/tests/support/server-only.ts` } },
  test: { name: 'soak', include: ['tests/soak/**/*.test.ts'], testTimeout: 3_600_000, hookTimeout: 60_000 },
});
