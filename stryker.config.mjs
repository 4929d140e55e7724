/** Changes the numerics one place at a time and counts what no test notices: `npm run test:mutations`, or with `-- --mutate 'lib/numerics/norms/**'`. */
const config = {
  testRunner: 'vitest',
  vitest: { configFile: 'tests/mutations.vitest.config.ts' },
  plugins: ['@stryker-mutator/vitest-runner'],
  mutate: ['lib/numerics/{outcome,order,uncertainty,convergence,spacing}/**/*.ts'],
  // Texts are for people, and hints to a reader are not figures.
  mutator: { excludedMutations: ['StringLiteral'] },
  ignorePatterns: ['.next', '.fourfold', 'fixtures/solver-output', 'fixtures/screenshots'],
  coverageAnalysis: 'perTest',
  concurrency: 2,
  timeoutMS: 20_000,
  reporters: ['clear-text', 'json'],
  clearTextReporter: { allowColor: false, reportTests: false, logTests: false },
  jsonReporter: { fileName: '.fourfold/mutations/report.json' },
  tempDirName: '.fourfold/mutations/work',
};

export default config;
