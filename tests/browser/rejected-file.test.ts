import { expect } from 'vitest';
import { getStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { dropFiles } from '@/tests/support/drop-files';
import { signUp } from '@/tests/support/people';
import { brokenFile, makeSolverStudy, solverFiles } from '@/tests/support/solver-study';

const series = 'A1_poisson_p1_node';

browserTest('a broken file says where and why it was rejected, and another one takes its place', async ({ open }) => {
  const person = await signUp();
  const { study } = await makeSolverStudy(person, series);
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person });
  const [coarsest, ...others] = solverFiles(series);
  const broken = { ...brokenFile('text_in_number.csv'), name: coarsest?.name ?? '' };
  await dropFiles(page.getByRole('table', { name: /^Grids/ }), [broken, ...others]);

  const row = page.getByRole('row', { name: /rejected/ });
  await row.waitFor({ timeout: 30_000 });
  await page.getByText(/^Line \d+, column \d+: found “.*”; expected a finite number/).waitFor();
  expect(await seriousFindings(page)).toEqual([]);
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);
  await page.getByRole('row', { name: /\bread\b/ }).nth(3).waitFor({ timeout: 30_000 });
  const before = await ok(person, getStudyContract, { params: { id: study.id } });
  expect(before.grids.filter(({ state }) => state === 'read')).toHaveLength(4);

  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: /^Replace file, grid/ }).filter({ visible: true }).first().click();
  const [{ label } = { label: '' }] = before.grids.filter(({ state }) => state === 'rejected');
  expect((await row.textContent())?.startsWith(label)).toBe(true);
  await (await chooser).setFiles({ name: 'mended.csv', mimeType: 'text/csv', buffer: coarsest?.bytes ?? Buffer.alloc(0) });
  await page.getByText(/divides the .* error of/).first().waitFor({ timeout: 30_000 });
  await page.getByRole('table', { name: /^Table 2\./ }).getByTitle('mended.csv').waitFor();
});

browserTest('files whose names and sizes tell nothing wait until a person says which grid they are', async ({ open }) => {
  const person = await signUp();
  const { study } = await makeSolverStudy(person, series);
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person });
  const [coarsest, next] = solverFiles(series);
  await dropFiles(page.getByRole('table', { name: /^Grids/ }), [{ name: 'first.csv', bytes: coarsest?.bytes ?? Buffer.alloc(0) }, { name: 'second.csv', bytes: next?.bytes ?? Buffer.alloc(0) }]);
  const [finest] = study.grids;
  const labels = study.grids.map(({ label }) => label).reverse();
  expect(finest?.label).toBe(labels.at(-1));
  await page.getByLabel('Grid of first.csv').selectOption(labels[0] ?? '');
  await page.getByLabel('Grid of second.csv').selectOption(labels[0] ?? '');
  await page.getByText(`Grid ${labels[0]} has two files.`).waitFor();
  await page.getByLabel('Grid of second.csv').selectOption(labels[1] ?? '');
  await page.getByRole('button', { name: 'Send 2 files' }).click();
  await page.getByRole('row', { name: new RegExp(`^${labels[1]}\\b.*second\\.csv.*read`) }).waitFor({ timeout: 30_000 });
});
