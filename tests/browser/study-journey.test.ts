import { expect } from 'vitest';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { dropFiles } from '@/tests/support/drop-files';
import { signUp } from '@/tests/support/people';
import { makeSolverStudy, solverFiles } from '@/tests/support/solver-study';

declare global { interface Window { openedAt?: number } }

const series = 'D1_laplace_orthogonal';
const atMost = 10_000;

browserTest('five dropped files find their grids, wait for their columns, and come to a pass without a reload', async ({ open }) => {
  const person = await signUp();
  const { study, again } = await makeSolverStudy(person, series, 'temperature');
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person });
  await page.evaluate(() => { window.openedAt = Date.now(); });

  await dropFiles(page.getByRole('table', { name: /^Grids/ }), solverFiles(series));
  await page.getByRole('row', { name: /n128.*grid_5\.csv\.gz/ }).waitFor();
  for (const label of ['n8', 'n16', 'n32', 'n64', 'n128']) {
    await page.getByRole('row', { name: new RegExp(`^${label}\\b.*needs columns`) }).waitFor({ timeout: 30_000 });
  }
  const columns = page.getByRole('form', { name: 'Columns' });
  await columns.getByRole('columnheader', { name: 'vol' }).waitFor();
  expect(await columns.getByLabel('Coordinate x').inputValue()).toBe('x');
  expect(await columns.getByLabel('Weight of a row').inputValue()).toBe('vol');
  expect(await columns.getByLabel('Field temperature').inputValue()).toBe('');
  expect(await seriousFindings(page)).toEqual([]);

  await columns.getByRole('button', { name: 'Save columns and read' }).click();
  await columns.getByText('No column. Choose the one that holds it.').waitFor();
  await columns.getByLabel('Field temperature').selectOption('T');
  const saved = Date.now();
  await columns.getByRole('button', { name: 'Save columns and read' }).click();
  await page.getByText(/Halving the spacing divides the/).waitFor({ timeout: atMost });
  expect(Date.now() - saved).toBeLessThan(atMost);
  expect(await page.evaluate(() => window.openedAt)).toBeTypeOf('number');
  expect((await page.locator('.page-statement').textContent())?.trim())
    .toMatch(/^Pass\. Halving the spacing divides the L(1|2|∞) error of temperature by \d\.\d\d; second order would divide it by 4\.$/);
  await page.getByRole('table', { name: /^Table 1\./ }).getByRole('row', { name: /L2 pass/ }).waitFor();
  expect(await seriousFindings(page)).toEqual([]);
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);

  const next = await again();
  const second = await open(`/${person.at.slug}/studies/${next.id}`, { person });
  await dropFiles(second.getByRole('table', { name: /^Grids/ }), solverFiles(series));
  await second.getByText(/Halving the spacing divides the/).waitFor({ timeout: 30_000 });
});
