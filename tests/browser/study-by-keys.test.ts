import type { Page } from 'playwright-core';
import { expect } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { signUp } from '@/tests/support/people';
import { readQuantityTable } from '@/tests/support/solver-set';
import { makeWork } from '@/tests/support/work';

const focusedName = () => document.activeElement?.getAttribute('aria-label') ?? document.activeElement?.textContent ?? '';

async function tabTo(page: Page, name: RegExp): Promise<void> {
  for (let stops = 0; stops < 80; stops += 1) {
    if (name.test(await page.evaluate(focusedName))) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`No stop is called ${name.source}.`);
}

browserTest('without a mouse: a grid is left out and taken back, values are pasted, judged, and a new revision is opened', async ({ open }) => {
  const person = await signUp();
  const { code, problem, release } = await makeWork(person);
  const rows = readQuantityTable('E1_plate_hole_cps4r');
  const made = await ok(person, createCaseContract, {
    body: { code: code.slug, problem: problem.slug, name: 'Stress at a hole', kind: 'solution', quantities: [{ name: 'peak', unit: 'MPa', formalOrder: 2, target: 0.2 }] },
  });
  const grids = rows.map(({ N }, index) => ({ label: `g${index + 1}`, cells: Number(N) }));
  const study = await ok(person, createStudyContract, { body: { case: made.slug, release: release.version, grids } });
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person });

  await tabTo(page, /^Leave grid g1 out$/);
  await page.keyboard.press('Enter');
  await page.keyboard.type('Too coarse to resolve the hole');
  await page.keyboard.press('Enter');
  await page.getByRole('row', { name: /g1.*left out/ }).waitFor();
  await page.getByText('Too coarse to resolve the hole').waitFor();
  await tabTo(page, /^Take grid g1 back in$/);
  await page.keyboard.press('Enter');
  await page.getByRole('row', { name: /g1.*expected/ }).waitFor();

  await page.evaluate((text) => navigator.clipboard.writeText(text), rows.map(({ peak_sxx }) => peak_sxx).join('\n'));
  await tabTo(page, /^peak, grid g1$/);
  await page.keyboard.press('ControlOrMeta+v');
  expect(await page.getByLabel('peak, grid g5').inputValue()).toBe(rows[4]?.peak_sxx);
  await tabTo(page, /^Save values$/);
  await page.keyboard.press('Enter');
  await page.getByText(/The values of peak converge/).waitFor({ timeout: 30_000 });
  expect(await seriousFindings(page)).toEqual([]);
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);

  await tabTo(page, /^Add a grid in a new revision$/);
  await page.keyboard.press('Enter');
  await page.getByRole('link', { name: '1', exact: true }).waitFor({ timeout: 30_000 });
  await tabTo(page, /^Add a grid$/);
  await page.keyboard.press('Enter');
  await page.keyboard.type('g6');
  await tabTo(page, /^Add the grid$/);
  await page.keyboard.press('Enter');
  await page.getByText(/Grid g6/).first().waitFor();
  expect(await seriousFindings(page)).toEqual([]);
});
