import fs from 'node:fs';

/** @typedef {{ passed: number, failed: number }} Counts */

/**
 * True counts from vitest's JSON report. A file that fails outside its tests (it cannot be loaded, or its set-up
 * throws) counts as one failure; so does a run that ends badly with nothing to show for it.
 * @param {string} reportFile @param {boolean} endedWell whether vitest itself ended with success
 * @returns {Counts}
 */
export function readCounts(reportFile, endedWell) {
  if (!fs.existsSync(reportFile)) return { passed: 0, failed: 1 };
  const report = JSON.parse(fs.readFileSync(reportFile, 'utf8'));
  let passed = 0;
  let failed = 0;
  for (const file of report.testResults) {
    const failures = file.assertionResults.filter((/** @type {{ status: string }} */ test) => test.status === 'failed').length;
    passed += file.assertionResults.filter((/** @type {{ status: string }} */ test) => test.status === 'passed').length;
    failed += failures === 0 && file.status === 'failed' ? 1 : failures;
  }
  if (failed === 0 && (!endedWell || passed === 0)) failed = 1;
  return { passed, failed };
}
