import { insertMembership, listMembershipsOfUser } from '@/db/queries/memberships';
import { insertOrganisation } from '@/db/queries/organisations';
import { findUserByEmail, insertUser } from '@/db/queries/users';
import type { Role } from '@/lib/domain/people/roles';
import type { Context } from '../context';
import { newId } from '../keys';
import { withOrganisation, withUser } from '../with-organisation';
import { hashPassword } from './password';

interface SeededOrganisation { slug: string; name: string; members: readonly { email: string; roles: Role[] }[] }

/** Makes the organisation and those of its members that are not there yet; says what it made, a line each. */
export async function seedOrganisation(ctx: Pick<Context, 'db'>, { slug, name, members }: SeededOrganisation, password: string): Promise<string[]> {
  const made: string[] = [];
  const people = await Promise.all(members.map(async (member) => ({ ...member, ...(await findMember(ctx, member.email, slug)) })));
  const presentId = people.find((person) => person.organisationId !== null)?.organisationId;
  const organisation = { id: presentId ?? newId() };
  const passwordHash = await hashPassword(password);
  await withOrganisation({ db: ctx.db, organisation }, async (trx) => {
    if (!presentId) {
      if (!(await insertOrganisation(trx, { id: organisation.id, slug, name }))) throw new Error(`Another organisation has the short name ${slug} already.`);
      made.push(`organisation ${name}`);
    }
    for (const { email, roles, userId, organisationId } of people) {
      const id = userId ?? newId();
      if (!userId) await insertUser(trx, { id, email, password_hash: passwordHash });
      if (!organisationId) {
        await insertMembership(trx, { organisation_id: organisation.id, user_id: id, roles });
        made.push(`${email} (${roles.join(', ')})`);
      }
    }
  });
  return made;
}

/** An organisation is only visible to its members, so it is found through one of them. */
async function findMember(ctx: Pick<Context, 'db'>, email: string, slug: string): Promise<{ userId: string | null; organisationId: string | null }> {
  const user = await findUserByEmail(ctx.db, email);
  if (!user) return { userId: null, organisationId: null };
  const memberships = await withUser(ctx, user.id, (trx) => listMembershipsOfUser(trx, user.id));
  return { userId: user.id, organisationId: memberships.find((row) => row.slug === slug)?.id ?? null };
}
