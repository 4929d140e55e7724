import { sql, type Kysely, type RawBuilder } from 'kysely';
import type { DB } from '../schema.generated';

/** What is not as it must be: where it stands and why. */
export interface RecordFault { place: string; id: string; fault: string }

const ofOrganisation = (column: string, organisationId: string | null): RawBuilder<unknown> =>
  organisationId === null ? sql`true` : sql`${sql.ref(column)} = ${organisationId}::uuid`;

/** A grid that is read has one result, of the file it names. */
const unreadGrids = (only: RawBuilder<unknown>) => sql<RecordFault>`
  select 'grids' as place, g.id::text as id,
    case when r.grid_id is null then 'is read, and has no result' else 'has the result of another file than it names' end as fault
  from grids g left join grid_results r on r.organisation_id = g.organisation_id and r.grid_id = g.id
  where ${only} and g.state = 'read' and (r.grid_id is null or r.upload_id is distinct from g.upload_id)`;

/** A file that waits to be read has a job that will read it. */
const forgottenFiles = (only: RawBuilder<unknown>) => sql<RecordFault>`
  select 'grids' as place, g.id::text as id, 'is ' || g.state || ', and no job will read it' as fault
  from grids g join study_revisions v on v.organisation_id = g.organisation_id and v.study_id = g.study_id and v.revision = g.study_revision
  where ${only} and v.state = 'collecting' and g.state in ('stored', 'reading')
    and not exists (select from outbox o where o.subject_id = g.id and o.job = 'grid.read' and o.state <> 'done')`;

/** A revision whose grids are done is assessed, or a job will do it. */
const stuckRevisions = (only: RawBuilder<unknown>) => sql<RecordFault>`
  select 'study_revisions' as place, v.study_id || ' revision ' || v.revision as id,
    case v.state when 'assessing' then 'waits for its assessment, and no job will make it' else 'has every grid, and was not sent to assessment' end as fault
  from study_revisions v
  where ${only} and (
    (v.state = 'assessing' and not exists (
      select from outbox o where o.subject_id = v.study_id and o.subject_revision = v.revision and o.job = 'study.assess' and o.state <> 'done'))
    or (v.state = 'collecting'
      and exists (select from grids g where g.organisation_id = v.organisation_id and g.study_id = v.study_id and g.study_revision = v.revision
        and g.excluded is null)
      and not exists (select from grids g where g.organisation_id = v.organisation_id and g.study_id = v.study_id and g.study_revision = v.revision
        and g.excluded is null and g.state not in ('read', 'typed'))))`;

/** One assessment for each revision that is assessed, none before. */
const missingAssessments = (only: RawBuilder<unknown>) => sql<RecordFault>`
  select 'study_revisions' as place, v.study_id || ' revision ' || v.revision as id,
    'is ' || v.state || ', with ' || count(a.id) || ' assessments' as fault
  from study_revisions v left join assessments a on a.organisation_id = v.organisation_id and a.study_id = v.study_id and a.study_revision = v.revision
  where ${only}
  group by v.organisation_id, v.study_id, v.revision, v.state
  having count(a.id) > 1 or (count(a.id) = 0 and v.state in ('assessed', 'in-review', 'signed')) or (count(a.id) = 1 and v.state in ('collecting', 'assessing'))`;

/** An assessment names the bytes that its grids name, and its own hash of all it was computed from. */
const foreignInputs = (only: RawBuilder<unknown>) => sql<RecordFault>`
  select 'assessments' as place, a.id::text as id, 'names SHA-256 ' || (input->>'sha256') || ' for grid ' || (input->>'label') || ', whose file has '
    || coalesce(u.sha256, 'none') as fault
  from assessments a
    cross join lateral jsonb_array_elements(a.body->'inputs') input
    left join grids g on g.organisation_id = a.organisation_id and g.study_id = a.study_id and g.study_revision = a.study_revision and g.label = input->>'label'
    left join uploads u on u.organisation_id = g.organisation_id and u.id = g.upload_id
  where ${only} and (u.sha256 is distinct from input->>'sha256' or u.bytes is distinct from (input->>'bytes')::bigint)
  union all
  select 'assessments', a.id::text, 'is kept under another hash of its inputs than it states'
  from assessments a where ${only} and a.body->>'inputsSha256' is distinct from a.inputs_sha256`;

/** An open row of the outbox is about something that is there, and moves. */
const idleOutbox = (only: RawBuilder<unknown>) => sql<RecordFault>`
  select 'outbox' as place, o.id::text as id, o.job || ' is ' || o.state || ' since ' || greatest(o.due_at, o.queued_at)::text || coalesce(': ' || o.last_error, '') as fault
  from outbox o where ${only} and o.state <> 'done' and greatest(o.due_at, o.queued_at) < now() - interval '1 hour'
  union all
  select 'outbox', o.id::text, o.job || ' is about ' || o.subject_id || ', which is not there'
  from outbox o where ${only} and o.state <> 'done' and (
    (o.job = 'grid.read' and not exists (select from grids g where g.id = o.subject_id))
    or (o.job = 'study.assess' and not exists (select from study_revisions v where v.study_id = o.subject_id and v.revision = o.subject_revision)))`;

/** A mail that waits has a job that sends it. */
const forgottenMails = (only: RawBuilder<unknown>) => sql<RecordFault>`
  select 'mails' as place, m.id::text as id, 'waits to be sent, and no job will send it' as fault
  from mails m where ${only} and m.state = 'queued' and not exists (select from outbox o where o.subject_id = m.id and o.job = 'mail.send' and o.state <> 'done')`;

const checks: { alias: string; statement: (only: RawBuilder<unknown>) => RawBuilder<RecordFault> }[] = [
  { alias: 'g', statement: unreadGrids }, { alias: 'g', statement: forgottenFiles }, { alias: 'v', statement: stuckRevisions },
  { alias: 'v', statement: missingAssessments }, { alias: 'a', statement: foreignInputs }, { alias: 'o', statement: idleOutbox }, { alias: 'm', statement: forgottenMails },
];

const mostFaults = 1000;

/** Everything in the database that is not as it must be, of one organisation or of all; at most a thousand of each kind. */
export async function listRecordFaults(db: Kysely<DB>, organisationId: string | null): Promise<RecordFault[]> {
  const found: RecordFault[] = [];
  for (const { alias, statement } of checks) {
    const { rows } = await sql<RecordFault>`select * from (${statement(ofOrganisation(`${alias}.organisation_id`, organisationId))}) faults limit ${mostFaults}`.execute(db);
    found.push(...rows);
  }
  return found;
}

/** Mails that were being sent when it was last heard of them, long ago: whether they went out nobody knows. */
export function listUnsureMails(db: Kysely<DB>, organisationId: string | null) {
  return db
    .selectFrom('mails')
    .select(['id', 'address', 'claimed_at'])
    .where('state', '=', 'sending')
    .where('claimed_at', '<', sql<Date>`now() - interval '10 minutes'`)
    .$if(organisationId !== null, (query) => query.where('organisation_id', '=', organisationId))
    .orderBy('claimed_at')
    .limit(mostFaults)
    .execute();
}

/** A page of whole files in the order of their ids. */
export function listStoredUploads(db: Kysely<DB>, { organisationId, after, limit }: { organisationId: string | null; after: string | null; limit: number }) {
  return db
    .selectFrom('uploads')
    .select(['id', 'storage_key', 'bytes', 'sha256'])
    .where('state', '=', 'stored')
    .$if(organisationId !== null, (query) => query.where('organisation_id', '=', organisationId))
    .$if(after !== null, (query) => query.where('id', '>', after))
    .orderBy('id')
    .limit(limit)
    .execute();
}

/** Of the keys given those that a row names, with what it says. */
export function listNamings(db: Kysely<DB>, keys: string[]) {
  return db.selectFrom('uploads').select(['storage_key', 'state', 'multipart_id']).where('storage_key', 'in', keys).where('state', '<>', 'given-up').execute();
}
