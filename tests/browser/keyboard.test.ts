import { expect } from 'vitest';
import { browserTest } from '@/tests/support/browser';
import { makeShownWork } from '@/tests/support/shown-work';

const focusedName = () => {
  const focused = document.activeElement === document.body ? null : document.activeElement;
  return focused?.getAttribute('aria-label') ?? focused?.textContent ?? '';
};

browserTest('the first stop of a page skips to its content', async ({ open }) => {
  const page = await open('/');
  await page.keyboard.press('Tab');
  expect(await page.evaluate(focusedName)).toBe('Skip to content');
  await page.keyboard.press('Enter');
  expect(await page.evaluate(() => document.activeElement?.id)).toBe('content');
});

browserTest('the matrix is one stop, its cells are reached by arrows, and the line under it reads them out', async ({ open }) => {
  const { person, study } = await makeShownWork();
  const page = await open(`/${person.at.slug}`, { person });
  expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe('Brack');
  await page.getByRole('link', { name: /1\.1\.0: fail/ }).focus();
  expect(await page.evaluate(focusedName)).toBe('Heat, second order, 1.1.0: fail, order 1.20 of 2');
  await page.keyboard.press('ArrowLeft');
  expect(await page.evaluate(focusedName)).toBe('Heat, second order, 1.0.0: pass, order 2.00 of 2');
  await page.getByText('Heat, second order, 1.0.0: pass.').waitFor();
  expect(await page.getByRole('grid').locator('[tabindex="0"]').count()).toBe(1);
  await page.keyboard.press('End');
  await page.keyboard.press('Enter');
  await page.waitForURL(`**/studies/${study}`);
});

browserTest('the account menu opens, moves and closes by keys', async ({ open }) => {
  const { person } = await makeShownWork();
  const page = await open(`/${person.at.slug}/codes`, { person });
  await page.getByRole('button', { name: /^Account/ }).focus();
  await page.keyboard.press('Enter');
  await page.getByRole('menuitem', { name: 'Tokens' }).waitFor();
  await page.keyboard.press('Escape');
  await expect.poll(() => page.evaluate(focusedName)).toContain('Account');
});
