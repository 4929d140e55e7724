import { expect } from 'vitest';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { heatSizes, heatTable } from '@/tests/support/grids';
import { signUp } from '@/tests/support/people';
import { awaitOutcome, putFile } from '@/tests/support/study';
import { makeWork } from '@/tests/support/work';

browserTest('a study read from files shows where its errors are, by grid, by pointer and by keys, and what its boundary does', async ({ open }) => {
  const person = await signUp();
  const work = await makeWork(person);
  const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: work.case.gridPlan } });
  for (const n of heatSizes) await putFile(person, { id: study.id, label: `n${n}` }, heatTable(n));
  await awaitOutcome(person, study.id);
  const path = `/${person.at.slug}/studies/${study.id}`;
  const page = await open(path, { person });

  // 0.3·h²·(1 + ½ sin πx) is largest in the two columns of cells beside the middle.
  const map = page.getByRole('slider', { name: 'Figure 2, place read out' });
  await map.waitFor();
  expect(await map.getAttribute('aria-valuetext')).toMatch(/^x 0\.484 to 0\.5, y 0 to 0\.0156: 1\.10\s×\s10⁻⁴$/);
  await page.getByText('64 × 64 bins, log scale.').waitFor();
  await map.focus();
  for (const key of ['ArrowRight', 'ArrowUp', 'PageUp', 'ArrowLeft']) await page.keyboard.press(key);
  expect(await map.getAttribute('aria-valuetext')).toMatch(/^x 0\.484 to 0\.5, y 0\.172 to 0\.188: 1\.10\s×\s10⁻⁴$/);
  await page.keyboard.press('Home');
  expect(await map.getAttribute('aria-valuenow')).toBe('32');

  const place = await map.boundingBox();
  await page.mouse.move((place?.x ?? 0) + 52, (place?.y ?? 0) + 36);
  await expect.poll(() => map.getAttribute('aria-valuetext')).toMatch(/^x 0 to 0\.0156, y 0\.984 to 1: 7\.\d\d\s×\s10⁻⁵$/);
  await page.getByLabel('Grid', { exact: true }).selectOption('n8');
  await page.getByText('8 × 8 bins, log scale.').waitFor();
  await page.getByRole('table', { name: /Interior and boundary/ }).getByRole('row', { name: /L2/ }).waitFor();
  expect(await seriousFindings(page)).toEqual([]);

  const narrow = await open(path, { person, size: 'phone', theme: 'dark' });
  await narrow.getByRole('slider', { name: 'Figure 2, place read out' }).waitFor();
  expect(await seriousFindings(narrow)).toEqual([]);
  expect(await overflowOf(narrow)).toBeLessThanOrEqual(0);
});

browserTest('a map that cannot be read says so and is read again, and typed values have none', async ({ open }) => {
  const person = await signUp();
  const work = await makeWork(person);
  const make = (release: string, grids: object[]) => ok(person, createStudyContract, { body: { case: work.case.slug, release, grids } });
  const typed = await make('1.0.0', heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n, errors: { T: { L2: 0.3 / n ** 2, Linf: 0.4 / n ** 2 } } })));
  await awaitOutcome(person, typed.id);
  const page = await open(`/${person.at.slug}/studies/${typed.id}`, { person });
  await page.getByText('No map of the errors: the values of all grids were typed.').waitFor();

  const mixed = await make('1.0.0', heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n, ...(n > 8 && { errors: { T: { L2: 0.3 / n ** 2, Linf: 0.4 / n ** 2 } } }) })));
  await putFile(person, { id: mixed.id, label: 'n8' }, heatTable(8));
  await awaitOutcome(person, mixed.id);
  let isAway = true;
  await page.route(/\/maps\/T\b/, (route) => (isAway ? route.fulfill({ status: 404, contentType: 'application/problem+json', body: JSON.stringify({ type: 'about:blank', title: 'Not found', status: 404, detail: 'Grid n8 has no map of T.', errors: [] }) }) : route.continue()));
  await page.goto(`/${person.at.slug}/studies/${mixed.id}`);
  await page.getByText('Grid n8 has no map of T.').waitFor();
  isAway = false;
  await page.getByRole('button', { name: 'Read again' }).click();
  await page.getByRole('slider', { name: 'Figure 2, place read out' }).waitFor();
});
