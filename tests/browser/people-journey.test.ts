import { expect } from 'vitest';
import { arrived, browserTest } from '@/tests/support/browser';
import { awaitMail } from '@/tests/support/inbox';
import { newEmail, password, signUp } from '@/tests/support/people';
import { need } from '@/tests/support/environment';

const linkIn = (text: string) => /^(https?:\/\/\S+token=\S+)$/m.exec(text)?.[1] ?? '';
const dayIn = (months: number) => new Date(Date.now() + months * 30 * 24 * 3600_000).toISOString().slice(0, 10);

browserTest('An owner invites by mail; somebody new and somebody known join, work in two organisations, and leave nothing behind when removed', async ({ open }) => {
  const [fresh, owner, known] = [newEmail('fresh'), newEmail('owner'), await signUp('Known Works')];
  const page = await open('/sign-up');
  await page.getByLabel('Organisation').fill('Journey Works');
  await page.getByLabel('E-mail').fill(owner);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Make the account' }).click();
  await page.waitForURL(/\/journey-works/);
  await arrived(page);
  await page.getByRole('button', { name: `Account ${owner}` }).click();
  await page.getByRole('menuitem', { name: 'Members' }).click();
  await arrived(page, 'Members');
  await page.getByText('only owner: stays').waitFor();

  await page.getByLabel('E-mail').fill(fresh);
  await page.getByLabel('auditor', { exact: true }).check();
  await page.getByRole('button', { name: 'Send invitation' }).click();
  await page.getByText('An auditor holds no other role.').waitFor();
  await page.getByLabel('engineer', { exact: true }).uncheck();
  await page.getByText('An auditor’s access has an end.').waitFor();
  await page.getByLabel('Access ends after').fill(dayIn(6));
  await page.getByRole('button', { name: 'Send invitation' }).click();
  await page.getByText(`A mail to ${fresh} is on its way.`).waitFor();
  await page.getByLabel('E-mail').fill(known.email);
  await page.getByRole('button', { name: 'Send invitation' }).click();
  await page.getByText(`A mail to ${known.email} is on its way.`).waitFor();
  await page.getByRole('row', { name: known.email }).getByText('pending').waitFor();

  const mail = await awaitMail(fresh);
  const auditor = await open('/');
  await auditor.goto(need('INBOX_URL'));
  await auditor.getByRole('link', { name: 'Invitation to Journey Works on Fourfold' }).first().click();
  await auditor.goto(linkIn(mail.text));
  await arrived(auditor, 'Join Journey Works');
  expect(new URL(auditor.url()).search).toBe('');
  await auditor.getByLabel('Password').fill(password);
  await auditor.getByRole('button', { name: 'Make the account and join' }).click();
  await auditor.waitForURL(/\/journey-works/);

  const link = new URL(linkIn((await awaitMail(known.email)).text));
  const engineer = await open(`${link.pathname}${link.search}`, { person: known });
  await engineer.getByRole('button', { name: 'Join Journey Works' }).click();
  await engineer.waitForURL(/\/journey-works/);
  const journey = new URL(engineer.url()).pathname.split('/')[1] ?? '';
  for (const [slug, code] of [[journey, 'brack'], [known.at.slug, 'weir']] as const) {
    await engineer.goto(`/${slug}/codes`);
    await arrived(engineer, 'Codes');
    await engineer.getByLabel('Name', { exact: true }).fill(code);
    await engineer.getByRole('button', { name: 'Make the code' }).click();
    await engineer.getByRole('link', { name: code, exact: true }).or(engineer.getByRole('heading', { name: code })).first().waitFor();
  }
  await engineer.getByRole('button', { name: `Account ${known.email}` }).click();
  await engineer.getByRole('menuitem', { name: 'Journey Works' }).click();
  await engineer.waitForURL(new RegExp(`/${journey}$`));
  await engineer.goto(`/${journey}/codes`);
  await engineer.getByRole('link', { name: 'brack' }).first().waitFor();
  expect(await engineer.getByText('weir').count()).toBe(0);

  await page.reload();
  await arrived(page, 'Members');
  await page.getByRole('button', { name: `Remove ${known.email}` }).click();
  await page.getByRole('button', { name: 'Remove member' }).click();
  await page.getByRole('button', { name: `Remove ${known.email}` }).waitFor({ state: 'detached' });
  await engineer.goto(`/${journey}/codes`);
  await engineer.getByRole('heading', { name: 'Not found' }).waitFor();
  expect((await awaitMail(known.email, 2)).subject).toBe('Your access to Journey Works has ended');
});

browserTest('A forgotten password is set anew by mail, and the old session has ended', async ({ open }) => {
  const person = await signUp();
  const page = await open('/sign-in');
  await page.getByRole('link', { name: 'Password forgotten?' }).click();
  await arrived(page, 'Set a new password');
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByRole('button', { name: 'Send the link' }).click();
  await page.getByText(`If ${person.email} has an account`).waitFor();
  await page.goto(linkIn((await awaitMail(person.email)).text));
  await arrived(page, 'Set a new password');
  await page.getByLabel('New password').fill('short');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await page.getByText('Expected at least 10 characters.').waitFor();
  await page.getByLabel('New password').fill('a better password');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await page.getByText('every session has ended').waitFor();
  await page.getByRole('link', { name: 'Sign in' }).last().click();
  await arrived(page, 'Sign in');
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByLabel('Password').fill('a better password');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(new RegExp(`/${person.at.slug}`));
  const old = await open('/account', { person });
  expect(new URL(old.url()).pathname).toBe('/sign-in');
});
