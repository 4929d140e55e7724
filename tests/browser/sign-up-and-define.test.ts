import { expect } from 'vitest';
import { browserTest } from '@/tests/support/browser';
import { newEmail, password, signUp } from '@/tests/support/people';

browserTest('somebody new signs up and defines a code, a release, a problem and a case', async ({ open }) => {
  const page = await open('/');
  await page.getByRole('link', { name: 'Sign up' }).click();
  await page.getByLabel('Organisation').fill('Harbour Solvers');
  await page.getByLabel('E-mail').fill(newEmail());
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Make the account' }).click();

  await page.getByRole('link', { name: 'Make a code' }).click();
  await page.getByLabel('Name', { exact: true }).fill('Tide');
  await page.getByRole('button', { name: 'Make the code' }).click();
  await page.getByRole('heading', { name: 'Tide', level: 1 }).waitFor();

  await page.getByLabel('Version').fill('1.4.0');
  await page.getByRole('button', { name: 'Make the release' }).click();
  await page.getByRole('rowheader', { name: '1.4.0' }).waitFor();
  await page.getByLabel('State of 1.4.0').selectOption('current');
  await expect.poll(() => page.getByLabel('State of 1.4.0').inputValue()).toBe('current');

  await page.getByRole('navigation', { name: 'Sections' }).getByRole('link', { name: 'Problems' }).click();
  await page.getByRole('link', { name: 'Make a problem' }).click();
  await page.getByLabel('Name', { exact: true }).fill('Standing wave');
  await page.getByLabel('Exact solution').fill('sin(2x)');
  await page.getByLabel('Name', { exact: true }).focus();
  await page.getByText('Character 6', { exact: false }).waitFor();
  await page.getByLabel('Exact solution').fill('sin(k*x)');
  await page.getByRole('button', { name: 'Add a constant' }).click();
  await page.getByLabel('Constant', { exact: true }).fill('k');
  await page.getByLabel('Value', { exact: true }).fill('2*pi');
  await page.locator('.katex-display').first().waitFor();
  await page.getByRole('button', { name: 'Make the problem' }).click();
  await page.getByRole('heading', { name: 'Standing wave', level: 1 }).waitFor();

  await page.getByRole('link', { name: 'Make a case' }).click();
  await page.getByLabel('Name', { exact: true }).fill('Standing wave, central');
  await page.getByLabel('Formal order, L2 of u').fill('2');
  await page.getByLabel('Formal order, Linf of u').fill('2');
  await page.getByLabel('Coarsest').fill('16');
  await page.getByRole('button', { name: 'Fill the plan' }).click();
  await page.getByRole('button', { name: 'Make the case' }).click();
  await page.getByRole('heading', { name: 'Standing wave, central', level: 1 }).waitFor();
  expect(await page.getByRole('rowheader', { name: 'n256' }).count()).toBe(1);

  await page.getByRole('button', { name: 'Start the study' }).click();
  await page.waitForURL(/\/studies\//);
});

browserTest('a refusal stands at its field, and nothing typed is lost', async ({ open }) => {
  const person = await signUp();
  const page = await open('/sign-up');
  await page.getByLabel('Organisation').fill('Second Works');
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Make the account' }).click();
  await expect.poll(() => page.getByLabel('E-mail').getAttribute('aria-invalid')).toBe('true');
  expect(await page.getByLabel('Organisation').inputValue()).toBe('Second Works');
});

browserTest('a page of an organisation asks for signing in first, then is shown', async ({ open }) => {
  const person = await signUp();
  const page = await open(`/${person.at.slug}/problems`);
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByLabel('Password').fill('not the password');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByText('E-mail and password do not match.').waitFor();
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(`**/${person.at.slug}/problems`);
  await page.getByRole('button', { name: /^Account/ }).click();
  await page.getByRole('menuitem', { name: 'Sign out' }).click();
  await page.waitForURL((url) => url.pathname === '/');
  await page.goto(`/${person.at.slug}`);
  expect(new URL(page.url()).pathname).toBe('/sign-in');
});

browserTest('the secret of a token is shown once and the token can be withdrawn', async ({ open }) => {
  const person = await signUp();
  const page = await open(`/${person.at.slug}/settings/tokens`, { person });
  await page.getByLabel('Name').fill('nightly');
  await page.getByRole('button', { name: 'Make the token' }).click();
  expect(await page.getByText(/^fft_/).textContent()).toMatch(/^fft_[\w-]{43}$/);
  await page.reload({ waitUntil: 'networkidle' });
  expect(await page.getByText(/^fft_/).count()).toBe(0);
  await page.getByRole('button', { name: 'Withdraw nightly' }).click();
  await page.getByRole('button', { name: 'Withdraw token nightly' }).click();
  await page.getByText('The tokens you make belong here.').waitFor();
});
