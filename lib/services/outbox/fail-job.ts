import { findGrid, updateGrid } from '@/db/queries/grids';
import { failOutboxRow } from '@/db/queries/outbox';
import { updateRevisionFailure, type RevisionKey } from '@/db/queries/study-revisions';
import type { JobName, JobPayload } from '@/lib/jobs/jobs';
import { announce } from '../studies/announce';
import { withOrganisation, type Trx } from '../with-organisation';
import type { JobContext } from './job-context';

/** After the first, the second and every later time that a job was given up. */
const retrySeconds = [10, 60, 300];

const retryAfter = (attempt: number) => 1000 * (retrySeconds[attempt - 1] ?? 300);

async function concerned(trx: Trx, name: JobName, { organisationId, subjectId, subjectRevision }: JobPayload): Promise<{ at: RevisionKey; what: string } | null> {
  // A mail and a re-check have states of their own, and no study to tell.
  if (name === 'mail.send' || name === 'study.recheck' || organisationId === null) return null;
  if (name === 'study.assess') return { at: { organisationId, studyId: subjectId, revision: subjectRevision ?? 0 }, what: 'The assessment could not be made yet' };
  const grid = await findGrid(trx, organisationId, subjectId);
  // Nothing is wrong with the file: it lies there to be read.
  if (grid) await updateGrid(trx, organisationId, grid.id, { state: 'stored' }, { states: ['reading'] });
  return grid ? { at: { organisationId, studyId: grid.study_id, revision: grid.study_revision }, what: `The file of grid ${grid.label} could not be read yet` } : null;
}

/** Every try of a job has failed: its study says so, nothing is given up, and the job comes again, after a while that grows to five minutes. */
export async function failJob(ctx: JobContext, name: JobName, payload: JobPayload, error: Error): Promise<void> {
  const now = ctx.clock();
  const row = { id: payload.outboxId, attempt: payload.attempt };
  // A job taken for dead may have ended well elsewhere, or be queued anew: then nothing has failed.
  if (!await failOutboxRow(ctx.db, row, { last_error: error.message, due_at: new Date(now.getTime() + retryAfter(payload.attempt)) })) return;
  const studyId = await withOrganisation(ctx, async (trx) => {
    const found = await concerned(trx, name, payload);
    if (!found) return null;
    await updateRevisionFailure(trx, found.at, `${found.what}: a service behind Fourfold did not answer. It is tried again by itself within minutes.`);
    return found.at.studyId;
  });
  if (studyId !== null) await announce(ctx, studyId, { event: 'state', state: name === 'study.assess' ? 'assessing' : 'collecting' });
}
