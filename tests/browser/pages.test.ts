import { beforeAll, describe, expect } from 'vitest';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { makeShownWork, type ShownWork } from '@/tests/support/shown-work';

let work: ShownWork;
beforeAll(async () => { work = await makeShownWork(); });

const publicPages = ['/', '/quick-check', '/docs/methods', '/docs/problems', '/docs/production', '/sign-in', '/sign-up', '/reset-password', '/reset-password?token=none', '/accept-invitation', '/nothing-here'];
const memberPages = [
  ['', 'release matrix'], ['/codes', 'codes'], ['/codes/brack', 'a code'], ['/problems', 'problems'], ['/problems/new', 'a new problem'],
  ['/problems/heat-in-a-square', 'a problem'], ['/cases', 'cases'], ['/cases/new', 'a new case'], ['/cases/heat-second-order', 'a case'],
  ['/studies', 'studies'], ['/studies/{study}', 'a study'], ['/studies/{spaceTime}', 'a study in space and time'],
  ['/settings/tokens', 'tokens'], ['/settings/members', 'members'], ['/settings/storage', 'storage'],
] as const;

const looks = [{ size: 'wide', theme: 'light' }, { size: 'wide', theme: 'dark' }, { size: 'phone', theme: 'light' }] as const;

describe.each(looks)('every page, $size and $theme', ({ size, theme }) => {
  browserTest.for(publicPages)('%s', async (path, { open }) => {
    const page = await open(path, { size, theme });
    expect(await overflowOf(page)).toBe(0);
    expect(await page.getByRole('heading', { level: 1 }).count()).toBe(1);
    expect(await seriousFindings(page)).toEqual([]);
  });

  browserTest.for(memberPages)('%s of an organisation: %s', async ([path], { open }) => {
    const page = await open(`/${work.person.at.slug}${path.replace('{study}', work.study).replace('{spaceTime}', work.spaceTimeStudy)}`, { size, theme, person: work.person });
    expect(await overflowOf(page)).toBe(0);
    expect(await page.getByRole('heading', { level: 1 }).count()).toBe(1);
    expect(await seriousFindings(page)).toEqual([]);
  });
});

browserTest('a page is sent with a content security policy of its own nonce', async ({ open }) => {
  const page = await open('/');
  const policies = await Promise.all([0, 1].map(async () => (await page.request.get('/')).headers()['content-security-policy'] ?? ''));
  expect(policies[0]).toMatch(/script-src 'self' 'nonce-[\w+/=]+' 'strict-dynamic';/);
  expect(policies[0]).not.toBe(policies[1]);
});

browserTest('somebody of another organisation finds nothing', async ({ open }) => {
  const page = await open('/sign-up');
  const response = await page.request.get(`/${work.person.at.slug}`);
  expect(new URL(response.url()).pathname).toBe('/sign-in');
  const other = await makeShownWork();
  const foreign = await open(`/${work.person.at.slug}/cases/${work.case.slug}`, { person: other.person });
  await foreign.getByRole('heading', { name: 'Not found' }).waitFor();
});
