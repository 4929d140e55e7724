import { beforeAll, describe, expect, it } from 'vitest';
import { listCodesContract } from '@/lib/domain/codes/schema';
import { meContract, signInContract, signOutContract, signOutEverywhereContract } from '@/lib/domain/people/schema';
import { adminDatabase } from '../support/admin-database';
import { ok, refused, send } from '../support/api';
import { cookieOf, makeToken, newEmail, password, signUp, type Person } from '../support/people';

let person: Person;
beforeAll(async () => {
  person = await signUp('Session Works');
});

describe('POST /api/v1/session', () => {
  it('signs in with a cookie that works', async () => {
    const response = await send(null, signInContract, { body: { email: ` ${person.email}`.trim().toUpperCase(), password } });
    expect(response.status).toBe(200);
    expect(await ok({ cookie: cookieOf(response) }, meContract, {})).toMatchObject({ email: person.email });
  });

  it('answers the same 401 for a wrong password and for an account that is not there', async () => {
    const wrong = await refused(null, signInContract, { body: { email: person.email, password: 'not the password' } });
    const nobody = await refused(null, signInContract, { body: { email: newEmail(), password } });
    expect(wrong).toEqual(nobody);
    expect(wrong.status).toBe(401);
  });

  it('answers 429 with Retry-After after ten wrong passwords for one account, and lets others in', async () => {
    const other = await signUp('Guessed Works');
    for (let attempt = 0; attempt < 10; attempt += 1) {
      expect((await send(null, signInContract, { body: { email: other.email, password: 'a wrong guess' } })).status).toBe(401);
    }
    const limited = await send(null, signInContract, { body: { email: other.email, password } });
    expect(limited.status).toBe(429);
    expect(Number(limited.headers['retry-after'])).toBeGreaterThan(0);
    expect((await send(null, signInContract, { body: { email: person.email, password } })).status).toBe(200);
  });
});

describe('DELETE /api/v1/session', () => {
  it('ends the session for good', async () => {
    const { cookie } = await signUp('Leaving Works');
    const response = await send({ cookie }, signOutContract, {});
    expect(response.status).toBe(204);
    expect(String(response.headers['set-cookie'])).toMatch(/fourfold_session=;.*Max-Age=0/);
    expect((await refused({ cookie }, meContract, {})).status).toBe(401);
  });

  it('answers 403 to a write with a cookie that does not say where it comes from', async () => {
    const sent = { headers: { cookie: person.cookie } };
    expect((await refused(null, signOutContract, sent)).status).toBe(403);
    const foreign = { headers: { cookie: person.cookie, origin: 'http://elsewhere.example' } };
    expect((await refused(null, signOutContract, foreign)).status).toBe(403);
  });

  it('answers 401 without a session and 403 to a token', async () => {
    expect((await refused(null, signOutContract, {})).status).toBe(401);
    expect((await refused(await makeToken(person, { scopes: ['read'] }), signOutContract, {})).status).toBe(403);
  });
});

describe('DELETE /api/v1/sessions', () => {
  it('ends every session of the person, and nobody else’s', async () => {
    const leaving = await signUp('Leaving Everywhere Works');
    const second = { cookie: cookieOf(await send(null, signInContract, { body: { email: leaving.email, password } })) };
    const response = await send(second, signOutEverywhereContract, {});
    expect(response.status).toBe(204);
    expect(String(response.headers['set-cookie'])).toMatch(/fourfold_session=;.*Max-Age=0/);
    for (const ended of [leaving, second]) expect((await refused(ended, meContract, {})).status).toBe(401);
    await ok(person, meContract, {});
  });

  it('answers 401 without a session and 403 to a token', async () => {
    expect((await refused(null, signOutEverywhereContract, {})).status).toBe(401);
    expect((await refused(await makeToken(person, { scopes: ['read'] }), signOutEverywhereContract, {})).status).toBe(403);
  });
});

describe('GET /api/v1/me', () => {
  it('shows a session all its organisations, and every call of it then names one', async () => {
    const [two, other] = [await signUp('Two Works'), await signUp('Other Works')];
    await adminDatabase().query("insert into memberships (organisation_id, user_id, roles) values ($1, $2, '{reviewer}')", [other.at.id, two.userId]);
    const me = await ok(two, meContract, {});
    expect(me.organisations.map((each) => [each.slug, each.roles])).toEqual([[two.at.slug, ['owner', 'engineer']], [other.at.slug, ['reviewer']]]);
    expect((await refused(two, listCodesContract, {})).status).toBe(400);
    expect((await ok({ ...two, organisation: other.at.slug }, listCodesContract, {})).items).toEqual([]);
  });

  it('shows a token its organisation and its scopes', async () => {
    const me = await ok(await makeToken(person, { scopes: ['read'] }), meContract, {});
    expect(me).toMatchObject({ email: person.email, organisations: [{ slug: person.at.slug }], token: { name: 'pipeline', code: null, scopes: ['read'] } });
  });

  it('answers 401 to nobody and to a token that is not known', async () => {
    expect((await refused(null, meContract, {})).status).toBe(401);
    expect((await refused({ token: 'fft_unknown' }, meContract, {})).status).toBe(401);
  });
});
