import { expect } from 'vitest';
import { addMember, signUp } from '@/tests/support/people';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { makeSolverStudy, solverFiles } from '@/tests/support/solver-study';
import { awaitOutcome, putFile } from '@/tests/support/study';

const series = 'D3_laplace_nonorth_uncorrected';

browserTest('a fail says what the refinement did, why that fails and what to look at, on any screen', async ({ open }) => {
  const person = await signUp();
  const { study } = await makeSolverStudy(person, series);
  const labels = study.grids.map(({ label }) => label).reverse();
  for (const [index, { bytes }] of solverFiles(series).entries()) await putFile(person, { id: study.id, label: labels[index] ?? '' }, bytes);
  expect((await awaitOutcome(person, study.id)).outcome).toBe('fail');
  const address = `/${person.at.slug}/studies/${study.id}`;

  const page = await open(address, { person });
  expect((await page.locator('.page-statement').textContent())?.trim())
    .toMatch(/^Fail\. Halving the spacing divides the L(1|2|∞) error of T by \d\.\d\d; second order would divide it by 4\.$/);
  await page.getByText(/The last two pairs show orders/).first().waitFor();
  await page.getByText(/Compare source term, boundary values/).first().waitFor();
  const outcomes = page.getByRole('table', { name: /^Table 1\./ });
  expect(await outcomes.getByRole('row', { name: /fail/ }).count()).toBe(3);
  await page.getByRole('button', { name: 'Numbers' }).first().click();
  await page.getByRole('table', { name: 'The errors of Figure 1.' }).waitFor();
  expect(await seriousFindings(page)).toEqual([]);

  for (const options of [{ theme: 'dark' }, { size: 'phone' }] as const) {
    const other = await open(address, { person, ...options });
    expect(await overflowOf(other)).toBeLessThanOrEqual(0);
    expect(await seriousFindings(other)).toEqual([]);
  }

  const reviewer = await open(address, { person: await addMember(person.at, ['reviewer']) });
  await reviewer.getByText('To open a new revision you need the role engineer.').waitFor();
  expect(await reviewer.getByRole('button', { name: /new revision/ }).count()).toBe(0);
});
