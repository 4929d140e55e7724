import type { Page } from 'playwright-core';
import { expect } from 'vitest';
import { getProblemContract } from '@/lib/domain/problems/schema';
import { adminDatabase } from '@/tests/support/admin-database';
import { ok } from '@/tests/support/api';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { addMember, password, signUp, type Person } from '@/tests/support/people';
import { makeWork } from '@/tests/support/work';

const endSessions = (person: Person) => adminDatabase().query('delete from sessions where user_id = $1', [person.userId]);
const dialogOf = (page: Page) => page.getByRole('dialog', { name: 'Sign in again' });

/** A problem whose new name is typed and not saved. */
async function typeName(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'Change the problem' }).click();
  await page.getByLabel('Name', { exact: true }).first().fill(name);
}

async function signInAs(page: Page, { email }: Person): Promise<void> {
  await dialogOf(page).getByLabel('E-mail').fill(email);
  await dialogOf(page).getByLabel('Password').fill(password);
  await dialogOf(page).getByRole('button', { name: 'Sign in' }).click();
}

browserTest('a session that ends while somebody types is begun again in place, and what was typed is saved', async ({ open }) => {
  const person = await signUp();
  const { problem } = await makeWork(person);
  const page = await open(`/${person.at.slug}/problems/${problem.slug}`, { person, size: 'phone' });
  await typeName(page, 'Heat, named anew');
  await endSessions(person);

  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await dialogOf(page).waitFor();
  expect(await dialogOf(page).getByLabel('E-mail').inputValue()).toBe(person.email);
  expect(await seriousFindings(page)).toEqual([]);
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);
  await page.keyboard.press('Escape');
  await page.getByText('Your session has ended.').waitFor();
  expect(await page.getByLabel('Name', { exact: true }).first().inputValue()).toBe('Heat, named anew');

  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await signInAs(page, person);
  await page.getByRole('heading', { level: 1, name: 'Heat, named anew' }).waitFor();
  const cookie = (await page.context().cookies()).find(({ name }) => name === 'fourfold_session');
  const saved = await ok({ ...person, cookie: `fourfold_session=${cookie?.value ?? ''}` }, getProblemContract, { params: { problem: problem.slug } });
  expect(saved).toMatchObject({ name: 'Heat, named anew', revision: 2 });
});

browserTest('where another person signs in, nothing is sent for them, and they are led to their own pages', async ({ open }) => {
  const person = await signUp();
  const { problem } = await makeWork(person);
  const other = await signUp('Elsewhere Works');
  const page = await open(`/${person.at.slug}/problems/${problem.slug}`, { person });
  await typeName(page, 'Typed by the first');
  await endSessions(person);
  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await signInAs(page, other);
  await page.getByText(`${other.email} is signed in now.`).waitFor();
  expect(await page.getByLabel('Name', { exact: true }).first().inputValue()).toBe('Typed by the first');
  expect(await seriousFindings(page)).toEqual([]);
  await page.getByRole('button', { name: 'Go to Elsewhere Works' }).click();
  await page.waitForURL(`**/${other.at.slug}`);
});

browserTest('a link followed after the session ended leads to signing in and then where it led', async ({ open }) => {
  const person = await signUp();
  const page = await open(`/${person.at.slug}/problems`, { person });
  await endSessions(person);
  await page.getByRole('navigation', { name: 'Sections' }).getByRole('link', { name: 'Cases' }).click();
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(`**/${person.at.slug}/cases`);
});

browserTest('offline is said, keeps the page and what is typed, and sending works once the connection is back', async ({ open }) => {
  const person = await signUp();
  const { problem } = await makeWork(person);
  const page = await open(`/${person.at.slug}/problems/${problem.slug}`, { person, failing: /./ });
  await typeName(page, 'Typed on a train');
  await page.context().setOffline(true);
  await page.getByText('You are offline.', { exact: true }).waitFor();
  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await page.getByText(/You are offline\. What you typed is still here; send it again/).waitFor();
  await page.getByRole('navigation', { name: 'Sections' }).getByRole('link', { name: 'Cases' }).click();
  await page.getByText(/That page cannot be loaded now/).waitFor();
  expect(await page.getByLabel('Name', { exact: true }).first().inputValue()).toBe('Typed on a train');

  await page.context().setOffline(false);
  await page.getByText('You are offline.', { exact: true }).waitFor({ state: 'detached' });
  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await page.getByRole('heading', { level: 1, name: 'Typed on a train' }).waitFor();
});

browserTest('somebody who loses a role or the organisation while typing is told, and the words stay', async ({ open }) => {
  const owner = await signUp();
  const { problem } = await makeWork(owner);
  const person = await addMember(owner.at, ['engineer']);
  const page = await open(`/${owner.at.slug}/problems/${problem.slug}`, { person, size: 'phone', theme: 'dark' });
  await typeName(page, 'Typed as engineer');
  const save = page.getByRole('button', { name: 'Save as a new revision' });
  await adminDatabase().query("update memberships set roles = '{reviewer}' where user_id = $1", [person.userId]);
  await save.click();
  await page.getByText('Your roles in Trial Works have changed.').waitFor();
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);

  await adminDatabase().query('delete from memberships where user_id = $1', [person.userId]);
  await save.click();
  await page.getByText('You are no longer a member of Trial Works.').waitFor();
  expect(await page.getByLabel('Name', { exact: true }).first().inputValue()).toBe('Typed as engineer');
  await page.getByRole('button', { name: 'Go to the front page' }).click();
  await page.getByRole('heading', { level: 1 }).waitFor();
});
