import { defineConfig } from 'vitest/config';

const alias = {
  '@': import.meta.dirname,
  'server-only': `${import.meta.dirname}/tests/support/server-only.ts`,
};

const project = (name: string, extra: object = {}) => ({
  resolve: { alias },
  test: { name, include: [`tests/${name}/**/*.test.ts`], ...extra },
});

export default defineConfig({
  test: {
    projects: [
      project('unit'),
      project('checks'),
      project('integration', { testTimeout: 60_000, hookTimeout: 60_000, fileParallelism: false }),
      project('browser', { testTimeout: 120_000, hookTimeout: 60_000, fileParallelism: false }),
      project('faults', { testTimeout: 120_000, hookTimeout: 60_000, fileParallelism: false }),
    ],
  },
});
