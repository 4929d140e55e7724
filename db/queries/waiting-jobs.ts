import { sql, type Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** The first file of these grids that waits to be read: since when, how many wait longer in the whole installation, and since when the oldest. */
export async function findPlaceInLine(db: Kysely<DB>, organisationId: string, gridIds: readonly string[]) {
  if (gridIds.length === 0) return undefined;
  const { rows } = await sql<{ since: Date; ahead: number; oldest: Date }>`
    with line as (select organisation_id, subject_id, created_at from outbox where job = 'grid.read' and state in ('waiting', 'queued', 'failed')),
      own as (select min(created_at) as since from line where organisation_id = ${organisationId} and subject_id in (${sql.join(gridIds)}))
    select own.since, count(*) filter (where line.created_at < own.since)::integer as ahead, min(line.created_at) as oldest
      from own cross join line where own.since is not null group by own.since`.execute(db);
  return rows[0];
}
