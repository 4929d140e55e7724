import { expect } from 'vitest';
import type { Page } from 'playwright-core';
import { assessContract } from '@/lib/domain/assessment/quick-schema';
import { ok } from '@/tests/support/api';
import { browserTest } from '@/tests/support/browser';

// Celik et al., J. Fluids Eng. 130, 078001, 2008, table 1, first column.
const celik = [[18000, 6.063], [8000, 5.972], [4500, 5.863]] as const;

async function paste(page: Page, text: string): Promise<void> {
  await page.evaluate((clip) => navigator.clipboard.writeText(clip), text);
  await page.getByLabel(/, row 1$/).first().focus();
  await page.keyboard.press('Control+V');
}

browserTest('a pasted table gives the figures that POST /assess gives', async ({ open }) => {
  const page = await open('/quick-check');
  await page.getByLabel('Spacing as').selectOption('cells');
  await page.getByLabel('Dimensions').selectOption('2');
  await paste(page, `cells\tvalue\n${celik.map((row) => row.join('\t')).join('\n')}`);
  await page.getByText('Pasted 3 rows, apart by tabs').waitFor();

  const { quantities: [answer] } = await ok(null, assessContract, {
    body: { dimension: 2, grids: celik.map(([cells, value]) => ({ cells, value })) },
  });
  await page.getByRole('button', { name: 'Copy as TSV' }).click();
  await page.getByText('Copied.').waitFor();
  const copied = await page.evaluate(() => navigator.clipboard.readText());
  const figures = new Map(copied.split('\n').map((line) => line.split('\t') as [string, string]));
  expect(Number(figures.get('order observed'))).toBe(answer?.orderObserved);
  expect(Number(figures.get('extrapolated'))).toBe(answer?.extrapolated);
  expect(Number(figures.get('GCI'))).toBe(answer?.gci);
  // Their table 1: p = 1.53, extrapolated 6.1685, GCI 2.2 %.
  const row = page.getByRole('table', { name: /three grids/ }).getByRole('row').nth(1);
  expect(await row.textContent()).toMatch(/1\.53.*2\.2/);
});

browserTest('errors typed by keyboard get an outcome with its reason', async ({ open }) => {
  const page = await open('/quick-check');
  await page.getByLabel('The table holds').selectOption('errors');
  await page.getByLabel('Formal order').fill('2');
  await page.getByLabel('Cells per direction, row 1').focus();
  for (const [cells, error] of [[8, '4.1e-2'], [16, '1.04e-2'], [32, '2.62e-3'], [64, '6.57e-4']] as const) {
    await page.keyboard.type(String(cells));
    await page.keyboard.press('Tab');
    await page.keyboard.press('Tab');
    await page.keyboard.type(error);
    await page.keyboard.press('Enter');
    await page.keyboard.press('Shift+Tab');
    await page.keyboard.press('Shift+Tab');
  }
  await page.getByText('Pass.', { exact: true }).waitFor();
  expect(await page.getByRole('table', { name: /observed order/ }).textContent()).toContain('1.90 to 2.20');
});

browserTest('a cell that holds no number says so and keeps what was typed', async ({ open }) => {
  const page = await open('/quick-check');
  await paste(page, '16 1.5\n32 1.2x\n64 1.1');
  await page.getByText('Found “1.2x”.').waitFor();
  expect(await page.getByLabel('Value, row 2').inputValue()).toBe('1.2x');
  expect(await page.getByLabel('Value, row 2').getAttribute('aria-invalid')).toBe('true');
});
