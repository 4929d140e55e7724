import { defineConfig } from 'vitest/config';

const alias = {
  '@': import.meta.dirname,
  'server-only': `${import.meta.dirname}/tests/support/server-only.ts`,
};

const project = (name: string, extra: object = {}) => ({
  resolve: { alias },
  test: { name, include: [`tests/${name}/**/*.test.ts`], testTimeout: 30_000, ...extra },
});

// These share one running product: one file at a time, one project after the other.
const shared = (groupOrder: number, testTimeout: number) => ({
  testTimeout,
  hookTimeout: 60_000,
  fileParallelism: false,
  sequence: { groupOrder },
});

export default defineConfig({
  test: {
    maxWorkers: 2,
    projects: [
      project('unit'),
      project('checks'),
      project('integration', shared(1, 60_000)),
      project('browser', shared(2, 120_000)),
      project('faults', shared(3, 120_000)),
      // Last, since it reads the logs of all the others.
      project('logs', shared(4, 60_000)),
    ],
  },
});
