import { randomBytes } from 'node:crypto';
import { v7 } from 'uuid';
import type { Role } from '@/lib/domain/people/roles';
import { signUpContract, type Me } from '@/lib/domain/people/schema';
import { createTokenContract } from '@/lib/domain/tokens/schema';
import type { TokenScope } from '@/lib/domain/tokens/scopes';
import { adminDatabase } from './admin-database';
import { ok, send } from './api';

export interface Person { userId: string; email: string; cookie: string; at: { id: string; slug: string; name: string } }

export const password = 'twelve letters';

export function newEmail(part = 'engineer'): string {
  return `${part}-${randomBytes(6).toString('hex')}@northmoor.example`;
}

/** The session cookie that an answer sets, as a request sends it. */
export function cookieOf(response: { headers: Record<string, unknown> }): string {
  const [cookie = ''] = response.headers['set-cookie'] as string[];
  return cookie.split(';')[0] ?? '';
}

/** Signs up: owner and engineer of an organisation of their own. */
export async function signUp(organisation = 'Trial Works'): Promise<Person> {
  const email = newEmail();
  const response = await send(null, signUpContract, { body: { email, password, organisation } });
  if (response.status !== 201) throw new Error(`Sign-up answered ${response.status}: ${response.text}`);
  const me = response.body as Me;
  const [at] = me.organisations;
  if (!at) throw new Error('Sign-up gave no organisation.');
  return { userId: me.id, email, cookie: cookieOf(response), at: { id: at.id, slug: at.slug, name: at.name } };
}

/** Another member of the organisation with the roles given, signed in. There is no call for that before invitations. */
export async function addMember(at: Person['at'], roles: Role[]): Promise<Person> {
  const person = { userId: v7(), email: newEmail(roles[0]), at };
  const session = randomBytes(20).toString('hex');
  const database = adminDatabase();
  await database.query('insert into users (id, email, password_hash) values ($1, $2, $3)', [person.userId, person.email, 'none: never signs in']);
  await database.query('insert into memberships (organisation_id, user_id, roles) values ($1, $2, $3)', [at.id, person.userId, roles]);
  await database.query("insert into sessions (id, user_id, expires_at) values ($1, $2, now() + interval '30 days')", [session, person.userId]);
  return { ...person, cookie: `fourfold_session=${session}` };
}

/** A token of the person, as a caller. */
export async function makeToken(person: Person, limits: { scopes: TokenScope[]; code?: string }): Promise<{ token: string }> {
  const { token } = await ok(person, createTokenContract, { body: { name: 'pipeline', ...limits } });
  return { token };
}
