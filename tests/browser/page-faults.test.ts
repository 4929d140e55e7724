import type { Page } from 'playwright-core';
import { v7 } from 'uuid';
import { expect } from 'vitest';
import { getCaseContract, updateCaseContract } from '@/lib/domain/cases/schema';
import { getProblemContract, updateProblemContract } from '@/lib/domain/problems/schema';
import { createStudyContract, getStudyContract } from '@/lib/domain/studies/schema';
import { adminDatabase } from '@/tests/support/admin-database';
import { ok } from '@/tests/support/api';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { addMember, signUp, type Person } from '@/tests/support/people';
import { makeWork, orderCase } from '@/tests/support/work';

const nameField = (page: Page) => page.getByLabel('Name', { exact: true }).first();

browserTest('where somebody else saved the problem meanwhile, who and what differs is shown, and mine is kept on demand', async ({ open }) => {
  const person = await signUp();
  const { problem } = await makeWork(person);
  const colleague = await addMember(person.at, ['engineer']);
  const page = await open(`/${person.at.slug}/problems/${problem.slug}`, { person, size: 'phone' });
  await page.getByRole('button', { name: 'Change the problem' }).click();
  await nameField(page).fill('Heat, as I say');
  await ok(colleague, updateProblemContract, { params: { problem: problem.slug }, headers: { 'if-match': '"1"' }, body: { name: 'Heat, as they say', constants: { k: 0.25 } } });
  await page.getByRole('button', { name: 'Save as a new revision' }).click();

  await page.getByText(`${colleague.email} saved revision 2 of this problem`).waitFor();
  await page.getByRole('row', { name: 'Name Heat, as they say Heat, as I say' }).waitFor();
  await page.getByRole('row', { name: 'Constant k 0.25 0.5' }).waitFor();
  expect(await page.getByRole('row', { name: /Exact solution/ }).count()).toBe(0);
  expect(await seriousFindings(page)).toEqual([]);
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);
  await page.getByRole('button', { name: 'Keep mine as revision 3' }).click();
  await page.getByRole('heading', { level: 1, name: 'Heat, as I say' }).waitFor();
  const kept = await ok(person, getProblemContract, { params: { problem: problem.slug } });
  expect(kept).toMatchObject({ revision: 3, name: 'Heat, as I say', constants: { k: 0.5 } });
});

browserTest('what somebody else made of the case is taken on demand, and saved with what is typed then', async ({ open }) => {
  const person = await signUp();
  const work = await makeWork(person);
  const colleague = await addMember(person.at, ['engineer']);
  const page = await open(`/${person.at.slug}/cases/${work.case.slug}`, { person });
  await page.getByRole('button', { name: 'Change the case' }).click();
  await nameField(page).fill('Mine');
  await ok(colleague, updateCaseContract, { params: { case: work.case.slug }, headers: { 'if-match': '"1"' }, body: { name: 'Theirs' } });
  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await page.getByRole('row', { name: 'Name Theirs Mine' }).waitFor();
  await page.getByRole('button', { name: 'Take theirs' }).click();
  expect(await nameField(page).inputValue()).toBe('Theirs');
  await nameField(page).fill('Theirs and mine');
  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await page.getByRole('heading', { level: 1, name: 'Theirs and mine' }).waitFor();
  expect(await ok(person, getCaseContract, { params: { case: work.case.slug } })).toMatchObject({ revision: 3, name: 'Theirs and mine' });
});

/** Files that wait to be read, as rows that no dispatcher takes; returns what takes them away. */
async function makeLine(person: Person, gridId: string, ahead: number): Promise<() => Promise<unknown>> {
  const rows = [...Array.from({ length: ahead }, (_, index) => ({ id: v7(), subject: v7(), seconds: 240 - index })), { id: v7(), subject: gridId, seconds: 20 }];
  for (const { id, subject, seconds } of rows) {
    await adminDatabase().query(
      `insert into outbox (id, organisation_id, job, subject_id, due_at, created_at) values ($1, $2, 'grid.read', $3, now() + interval '1 day', now() - make_interval(secs => $4))`,
      [id, person.at.id, subject, seconds],
    );
  }
  return () => adminDatabase().query('delete from outbox where id = any($1)', [rows.map(({ id }) => id)]);
}

browserTest('a file that waits says how many are before it and how long the oldest has waited', async ({ open }) => {
  const person = await signUp();
  const { case: made, release } = await makeWork(person);
  const study = await ok(person, createStudyContract, { body: { case: made.slug, release: release.version, grids: orderCase.gridPlan } });
  const { rows: [grid] } = await adminDatabase().query<{ id: string }>('update grids set state = $2 where study_id = $1 and label = $3 returning id', [study.id, 'stored', 'n8']);
  const removeLine = await makeLine(person, grid?.id ?? '', 12);
  try {
    const { waiting } = await ok(person, getStudyContract, { params: { id: study.id } });
    expect(waiting).toMatchObject({ ahead: 12, workerSeen: true });
    expect(waiting?.seconds).toBeGreaterThanOrEqual(20);
    const page = await open(`/${person.at.slug}/studies/${study.id}`, { person, size: 'phone' });
    await page.getByText('12 files are before the one that waits here; the oldest has waited 4 minutes.').waitFor();
    expect(await overflowOf(page)).toBeLessThanOrEqual(0);
  } finally {
    await removeLine();
  }
});

browserTest('a server that does not answer is said at the top, keeps what is typed, and the line goes once it is back', async ({ open }) => {
  const person = await signUp();
  const { problem } = await makeWork(person);
  const page = await open(`/${person.at.slug}/problems/${problem.slug}`, { person, failing: /./ });
  await page.getByRole('button', { name: 'Change the problem' }).click();
  await nameField(page).fill('Typed meanwhile');
  await page.route('**/api/v1/**', (call) => call.abort('connectionrefused'));
  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await page.getByText('The server does not answer.').waitFor();
  expect(await seriousFindings(page)).toEqual([]);
  await page.unroute('**/api/v1/**');
  await page.getByText('The server does not answer.').waitFor({ state: 'detached' });
  await page.getByRole('button', { name: 'Save as a new revision' }).click();
  await page.getByRole('heading', { level: 1, name: 'Typed meanwhile' }).waitFor();
});

browserTest('a part of the program that is no longer there offers to load the page again', async ({ open }) => {
  const page = await open('/sign-up', { failing: /./ });
  await page.route('**/_next/static/chunks/**', (call) => call.fulfill({ status: 404, body: '' }));
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Quick check' }).click();
  await page.getByText('Fourfold was updated.').waitFor();
  await page.unroute('**/_next/static/chunks/**');
  await page.getByRole('button', { name: 'Load the page again' }).click();
  await page.getByRole('heading', { level: 1, name: /check/i }).waitFor();
});

browserTest('an address of the organisation with nothing under it leads on within it', async ({ open }) => {
  const person = await signUp();
  const page = await open(`/${person.at.slug}/cases/nothing`, { person });
  await page.getByRole('heading', { level: 1, name: 'Not found' }).waitFor();
  await page.locator('#content').getByRole('link', { name: 'Cases' }).click();
  await page.waitForURL(`**/${person.at.slug}/cases`);
});
