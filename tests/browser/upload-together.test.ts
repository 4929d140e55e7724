import { expect } from 'vitest';
import { getStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { addMember, signUp } from '@/tests/support/people';
import { bigTable, fileInput, fileOf, makeUploadStudy, rowOf, throttle } from '@/tests/support/uploading';

/** So slow that the file is still on its way when the other has looked and answered. */
const slow = 1e6;

browserTest('the second to send for a grid sees whose file is on its way, may replace it, and the first is told', async ({ open }) => {
  const first = await signUp();
  const second = await addMember(first.at, ['engineer']);
  const study = await makeUploadStudy(first);
  const path = `/${first.at.slug}/studies/${study.id}`;
  const [page, other] = [await open(path, { person: first, failing: /partNumber=\d+&/ }), await open(path, { person: second })];
  await throttle(page, slow);
  await fileInput(page).setInputFiles(fileOf('n16.csv', bigTable(40)));
  await rowOf(other, 'n16').getByText(new RegExp(`by ${first.email}, since \\d\\d:\\d\\d`)).waitFor();

  await fileInput(other).setInputFiles(fileOf('n16-new.csv', bigTable(1)));
  const question = other.getByRole('group', { name: 'File for grid n16' });
  await question.getByText(`${first.email} sends n16.csv since`).waitFor();
  expect(await seriousFindings(other)).toEqual([]);
  await other.setViewportSize({ width: 390, height: 844 });
  expect(await overflowOf(other)).toBe(0);
  await question.getByRole('button', { name: 'Replace it' }).click();
  await page.getByText(`${second.email} replaced this file: grid n16 now has n16-new.csv.`).waitFor({ timeout: 10_000 });
  await rowOf(page, 'n16').getByText('not sent').waitFor();
  await rowOf(other, 'n16').getByText('256 rows').waitFor({ timeout: 20_000 });
  const { grids } = await ok(first, getStudyContract, { params: { id: study.id } });
  expect(grids.find(({ label }) => label === 'n16')?.upload).toMatchObject({ filename: 'n16-new.csv', createdBy: second.email });

  // A grid that is read takes another file; the one it has stays until that is whole.
  await page.getByRole('button', { name: 'Give up, grid n16' }).click();
  const choosing = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Replace file, grid n16' }).click();
  await (await choosing).setFiles(fileOf('n16-third.csv', bigTable(20)));
  await rowOf(page, 'n16').getByText('n16-new.csv stays until this one is whole.').waitFor();
  await page.getByRole('button', { name: 'Give up, grid n16' }).click();
  await rowOf(page, 'n16').getByText('256 rows').waitFor({ timeout: 20_000 });
  await rowOf(page, 'n16').getByText('n16-new.csv').waitFor();
});

browserTest('a second tab shows how far the first is and sends nothing twice', async ({ open }) => {
  const person = await signUp();
  const study = await makeUploadStudy(person);
  const path = `/${person.at.slug}/studies/${study.id}`;
  const page = await open(path, { person });
  const line = await throttle(page, 8e6);
  const file = fileOf('n16.csv', bigTable(40));
  await fileInput(page).setInputFiles(file);
  await rowOf(page, 'n16').getByText('receiving').waitFor();
  const tab = await page.context().newPage();
  let sentByTab = 0;
  tab.on('request', (request) => { if (request.method() === 'PUT') sentByTab += 1; });
  await tab.goto(path);
  await rowOf(tab, 'n16').getByText('receiving in another tab').waitFor();
  await fileInput(tab).setInputFiles(file);
  await tab.getByText('Another tab is sending this file. This row shows how far it is.').waitFor();
  await rowOf(tab, 'n16').getByText(/^(8\.4|17|25)\sMB of/).waitFor();
  await line.set(-1);
  await rowOf(tab, 'n16').getByText('256 rows').waitFor({ timeout: 20_000 });
  expect(sentByTab).toBe(0);
});
