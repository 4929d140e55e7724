import { describe, expect, it } from 'vitest';
import {
  changePasswordContract, confirmResetContract, getMailPreferencesContract, requestResetContract, updateMailPreferencesContract,
} from '@/lib/domain/people/account-schema';
import { meContract, signInContract } from '@/lib/domain/people/schema';
import { adminDatabase } from '../support/admin-database';
import { ok, refused, send } from '../support/api';
import { awaitMail, listInbox, tokenIn } from '../support/inbox';
import { cookieOf, makeToken, newEmail, password, signUp } from '../support/people';

const other = 'another twelve';

async function secondSession(email: string) {
  return { cookie: cookieOf(await send(null, signInContract, { body: { email, password } })) };
}

describe('POST /api/v1/password-resets', () => {
  it('answers the same for an address without an account, about as late, and sends nothing there', async () => {
    const [nobody, { email }] = [newEmail('nobody'), await signUp()];
    const took: number[] = [];
    for (const address of [nobody, email]) {
      const begun = performance.now();
      expect(await ok(null, requestResetContract, { body: { email: address } })).toEqual({ email: address });
      took.push(performance.now() - begun);
    }
    expect(Math.min(...took)).toBeGreaterThan(195);
    await awaitMail(email);
    expect(await listInbox(nobody)).toEqual([]);
  });

  it('answers 429 to the sixth for one address', async () => {
    const email = newEmail();
    for (let times = 0; times < 5; times += 1) await ok(null, requestResetContract, { body: { email } });
    expect(await refused(null, requestResetContract, { body: { email } })).toMatchObject({ status: 429 });
  });
});

describe('POST /api/v1/password-resets/confirm', () => {
  it('sets the password once, ends every session, and says so by mail', async () => {
    const person = await signUp();
    const { email } = person;
    await ok(null, requestResetContract, { body: { email } });
    const token = tokenIn(await awaitMail(email));
    expect(await refused(null, confirmResetContract, { body: { token, password: 'short' } })).toMatchObject({ status: 422, errors: [{ path: 'password' }] });
    const answers = await Promise.all([1, 2].map(() => send(null, confirmResetContract, { body: { token, password: other } })));
    expect(answers.map(({ status }) => status).sort()).toEqual([204, 409]);
    expect(await refused(person, meContract, {})).toMatchObject({ status: 401 });
    expect(await refused(null, signInContract, { body: { email, password } })).toMatchObject({ status: 401 });
    await ok(null, signInContract, { body: { email, password: other } });
    expect((await awaitMail(email, 2)).subject).toBe('Your password for Fourfold was changed');
  });

  it('refuses a link after an hour, an older one after a newer, and one nobody made', async () => {
    const { email } = await signUp();
    await ok(null, requestResetContract, { body: { email } });
    const first = tokenIn(await awaitMail(email));
    await adminDatabase().query("update password_resets set expires_at = now() where token_sha256 = sha256($1::bytea)", [first]);
    expect(await refused(null, confirmResetContract, { body: { token: first, password: other } })).toMatchObject({ status: 409, detail: /expired/ });
    await ok(null, requestResetContract, { body: { email } });
    const second = tokenIn(await awaitMail(email, 2));
    await ok(null, confirmResetContract, { body: { token: second, password: other } });
    expect(await refused(null, confirmResetContract, { body: { token: first, password: other } })).toMatchObject({ status: 409, detail: /served/ });
    expect(await refused(null, confirmResetContract, { body: { token: 'none', password: other } })).toMatchObject({ status: 404 });
  });
});

describe('POST /api/v1/me/password', () => {
  it('asks for the present one, keeps this session and ends the others', async () => {
    const person = await signUp();
    const elsewhere = await secondSession(person.email);
    const wrong = { body: { password: 'not this one', newPassword: other } };
    expect(await refused(person, changePasswordContract, wrong)).toMatchObject({ status: 422, errors: [{ path: 'password' }] });
    await ok(person, changePasswordContract, { body: { password, newPassword: other } });
    await ok(person, meContract, {});
    expect(await refused(elsewhere, meContract, {})).toMatchObject({ status: 401 });
    await awaitMail(person.email);
  });

  it('answers 403 to a token', async () => {
    const token = await makeToken(await signUp(), { scopes: ['read', 'write'] });
    expect(await refused(token, changePasswordContract, { body: { password, newPassword: other } })).toMatchObject({ status: 403 });
  });
});

describe('PATCH /api/v1/me/mail-preferences', () => {
  it('keeps what was chosen', async () => {
    const person = await signUp();
    expect(await ok(person, getMailPreferencesContract, {})).toEqual({ 'study-failed': true });
    expect(await ok(person, updateMailPreferencesContract, { body: { 'study-failed': false } })).toEqual({ 'study-failed': false });
    expect(await ok(person, updateMailPreferencesContract, { body: {} })).toEqual({ 'study-failed': false });
    const unknownKind: object = { weekly: true };
    expect(await refused(person, updateMailPreferencesContract, { body: unknownKind })).toMatchObject({ status: 422 });
  });
});
