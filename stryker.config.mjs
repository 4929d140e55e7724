/** Changes the numerics one place at a time and counts what no test notices: `npm run test:mutations`, or with `-- --mutate 'lib/numerics/norms/**'`. */
const config = {
  testRunner: 'vitest',
  vitest: { configFile: 'tests/mutations.vitest.config.ts' },
  plugins: ['@stryker-mutator/vitest-runner'],
  mutate: ['lib/numerics/{outcome,order,uncertainty,convergence,spacing,norms,fitting,space-time,patterns,reproduction}/**/*.ts'],
  // Texts are for people, and hints to a reader are not figures.
  mutator: { excludedMutations: ['StringLiteral'] },
  ignorePatterns: ['.next', '.fourfold', 'fixtures/solver-output', 'fixtures/screenshots'],
  coverageAnalysis: 'perTest',
  concurrency: 2,
  timeoutMS: 5_000,
  reporters: ['clear-text', 'json', 'progress-append-only'],
  clearTextReporter: { allowColor: false, reportTests: false, logTests: false },
  jsonReporter: { fileName: '.fourfold/mutations/report.json' },
  tempDirName: '.fourfold/mutations/work',
};

export default config;
