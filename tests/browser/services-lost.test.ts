import { afterEach, expect } from 'vitest';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { browserTest, seriousFindings } from '@/tests/support/browser';
import { heatTable } from '@/tests/support/grids';
import { breakNetwork, mendNetwork } from '@/tests/support/network/break-network';
import { signUp } from '@/tests/support/people';
import { makeWork } from '@/tests/support/work';

const lostFor = 60_000;

afterEach(mendNetwork);

browserTest('storage that is lost is named at the top with what still works, and a file goes on once it is back', async ({ open }) => {
  const person = await signUp();
  const work = await makeWork(person);
  const grids = [8, 16].map((n) => ({ label: `n${n}`, cellsPerDirection: n }));
  const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids } });
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person, failing: /./ });
  await breakNetwork({ client: 'web', service: 'storage', kind: 'lost', milliseconds: lostFor });
  await page.locator('input[type=file]').setInputFiles({ name: 'n8.csv', mimeType: 'text/csv', buffer: heatTable(8) });
  await page.getByText('Storage does not answer.').first().waitFor();
  await page.getByText('Studies can be read and values typed').waitFor();
  expect(await seriousFindings(page)).toEqual([]);
  await mendNetwork();
  await page.getByText('Studies can be read and values typed').waitFor({ state: 'detached' });
  const row = page.getByRole('row', { name: /^n8/ });
  await row.getByText('read', { exact: true }).or(page.getByRole('button', { name: /^Retry/ })).first().waitFor();
  const retry = page.getByRole('button', { name: /^Retry/ });
  if (await retry.count() > 0) await retry.first().click();
  await row.getByText('read', { exact: true }).waitFor();
});

browserTest('a page asked for while the database is lost says so, and is there once it is back', async ({ open }) => {
  const person = await signUp();
  const work = await makeWork(person);
  const address = `/${person.at.slug}/problems/${work.problem.slug}`;
  const page = await open(address, { person, failing: /./ });
  await breakNetwork({ client: 'web', service: 'postgres', kind: 'lost', milliseconds: lostFor });
  await page.goto(address);
  await page.getByText('The database does not answer.').waitFor();
  expect(await seriousFindings(page)).toEqual([]);
  await mendNetwork();
  await page.getByText('answer now').waitFor();
  await page.getByRole('button', { name: 'Load the page again' }).click();
  await page.getByRole('heading', { level: 1, name: work.problem.name }).waitFor();
});
