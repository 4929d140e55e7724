import { sql, type Insertable, type Kysely, type UpdateObject } from 'kysely';
import type { DB, Memberships } from '../schema.generated';

/** Needs `app.user_id` or the organisation to be set: row-level security shows nothing else. Access that has ended is none. */
export function listMembershipsOfUser(db: Kysely<DB>, userId: string) {
  return db
    .selectFrom('memberships')
    .innerJoin('organisations', 'organisations.id', 'memberships.organisation_id')
    .select(['organisations.id', 'organisations.slug', 'organisations.name', 'memberships.roles'])
    .where('memberships.user_id', '=', userId)
    .where((eb) => eb.or([eb('memberships.until', 'is', null), eb('memberships.until', '>', sql<Date>`now()`)]))
    .orderBy('memberships.created_at')
    .execute();
}

export function insertMembership(db: Kysely<DB>, row: Insertable<Memberships>) {
  return db.insertInto('memberships').values(row).execute();
}

function withPeople(db: Kysely<DB>, organisationId: string) {
  return db
    .selectFrom('memberships')
    .innerJoin('users', 'users.id', 'memberships.user_id')
    .select(['memberships.user_id as id', 'users.email', 'memberships.roles', 'memberships.until', 'memberships.created_at'])
    .select(sql<string[] | null>`(select array_agg(codes.slug order by codes.slug) from auditor_grants g
      join codes on codes.organisation_id = g.organisation_id and codes.id = g.code_id
      where g.organisation_id = memberships.organisation_id and g.user_id = memberships.user_id)`.as('code_slugs'))
    .where('memberships.organisation_id', '=', organisationId);
}

export function findMember(db: Kysely<DB>, organisationId: string, userId: string) {
  return withPeople(db, organisationId).where('memberships.user_id', '=', userId).executeTakeFirst();
}
export type MemberRow = NonNullable<Awaited<ReturnType<typeof findMember>>>;

export function findMemberByEmail(db: Kysely<DB>, organisationId: string, email: string) {
  return withPeople(db, organisationId).where('users.email', '=', email).executeTakeFirst();
}

/** Those who came last first. */
export function listMembers(db: Kysely<DB>, organisationId: string, page: { after: string | null; limit: number }) {
  return withPeople(db, organisationId)
    .$if(page.after !== null, (query) => query.where('memberships.user_id', '<', page.after as string))
    .orderBy('memberships.user_id', 'desc')
    .limit(page.limit)
    .execute();
}

export async function countOtherOwners(db: Kysely<DB>, organisationId: string, userId: string): Promise<number> {
  const { count } = await db
    .selectFrom('memberships')
    .select(({ fn }) => fn.countAll<string>().as('count'))
    .where('organisation_id', '=', organisationId)
    .where('user_id', '!=', userId)
    .where(sql<boolean>`'owner' = any (roles)`)
    .executeTakeFirstOrThrow();
  return Number(count);
}

export function updateMembership(db: Kysely<DB>, organisationId: string, userId: string, changes: UpdateObject<DB, 'memberships'>) {
  return db.updateTable('memberships').set(changes).where('organisation_id', '=', organisationId).where('user_id', '=', userId).execute();
}

export function deleteMembership(db: Kysely<DB>, organisationId: string, userId: string) {
  return db.deleteFrom('memberships').where('organisation_id', '=', organisationId).where('user_id', '=', userId).execute();
}
