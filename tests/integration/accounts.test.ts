import { beforeAll, describe, expect, it } from 'vitest';
import { meContract, signUpContract } from '@/lib/domain/people/schema';
import { ok, refused, send } from '../support/api';
import { cookieOf, newEmail, password, signUp, type Person } from '../support/people';

describe('POST /api/v1/accounts', () => {
  let first: Person;
  beforeAll(async () => {
    first = await signUp('Harbour Hydraulics');
  });

  it('makes an account that is owner and engineer of its organisation, and signs it in', async () => {
    const email = newEmail();
    const response = await send(null, signUpContract, { body: { email, password, organisation: 'Tidal Loads' } });
    expect(response.status).toBe(201);
    expect(response.body).toMatchObject({ email, token: null, organisations: [{ name: 'Tidal Loads', roles: ['owner', 'engineer'] }] });
    expect(String(response.headers['set-cookie'])).toMatch(/fourfold_session=.+HttpOnly.*SameSite=Lax/i);
    expect(await ok({ cookie: cookieOf(response) }, meContract, {})).toEqual(response.body);
  });

  it('numbers the slug of a second organisation of the same name', async () => {
    const second = await signUp('Harbour Hydraulics');
    const number = (slug: string) => Number(/^harbour-hydraulics(?:-(\d+))?$/.exec(slug)?.[1] ?? 1);
    expect(number(second.at.slug)).toBe(number(first.at.slug) + 1);
  });

  it('never gives an organisation the address of a page', async () => {
    expect((await signUp('Quick Check')).at.slug).toMatch(/^quick-check-\d+$/);
    expect((await signUp('API')).at.slug).toMatch(/^api-\d+$/);
  });

  it('answers 409 for an e-mail that has an account, however it is written', async () => {
    const problem = await refused(null, signUpContract, { body: { email: first.email.toUpperCase(), password, organisation: 'Other' } });
    expect(problem).toMatchObject({ status: 409, errors: [{ path: 'email' }] });
  });

  it('answers 422 naming the member for a short password and for a member it does not know', async () => {
    const short = await refused(null, signUpContract, { body: { email: newEmail(), password: 'short', organisation: 'Other' } });
    expect(short).toMatchObject({ status: 422, errors: [{ path: 'password' }] });
    const unknown = await refused(null, signUpContract, { body: { email: newEmail(), password, organisation: 'Other', roles: ['reviewer'] } });
    expect(unknown.status).toBe(422);
  });

  it('answers 403 when the browser says it comes from another site', async () => {
    const sent = { body: { email: newEmail(), password, organisation: 'Other' }, headers: { origin: 'http://elsewhere.example' } };
    expect((await refused(null, signUpContract, sent)).status).toBe(403);
  });
});
