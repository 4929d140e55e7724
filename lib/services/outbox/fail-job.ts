import { findGrid, updateGrid } from '@/db/queries/grids';
import { updateOutboxRow } from '@/db/queries/outbox';
import { updateRevisionFailure, type RevisionKey } from '@/db/queries/study-revisions';
import type { JobName, JobPayload } from '@/lib/jobs/jobs';
import { announce } from '../studies/announce';
import { withOrganisation, type Trx } from '../with-organisation';
import type { JobContext } from './job-context';

const retryMilliseconds = 5 * 60_000;

async function concerned(trx: Trx, name: JobName, { organisationId, subjectId, subjectRevision }: JobPayload): Promise<{ at: RevisionKey; what: string } | null> {
  // A mail and a re-check have states of their own, and no study to tell.
  if (name === 'mail.send' || name === 'study.recheck' || organisationId === null) return null;
  if (name === 'study.assess') return { at: { organisationId, studyId: subjectId, revision: subjectRevision ?? 0 }, what: 'The assessment could not be made yet' };
  const grid = await findGrid(trx, organisationId, subjectId);
  // Nothing is wrong with the file: it lies there to be read.
  if (grid) await updateGrid(trx, organisationId, grid.id, { state: 'stored' }, { states: ['reading'] });
  return grid ? { at: { organisationId, studyId: grid.study_id, revision: grid.study_revision }, what: `The file of grid ${grid.label} could not be read yet` } : null;
}

/** Every try of a job has failed: its study says so, nothing is given up, and the job comes again in five minutes. */
export async function failJob(ctx: JobContext, name: JobName, payload: JobPayload, error: Error): Promise<void> {
  const now = ctx.clock();
  await updateOutboxRow(ctx.db, payload.outboxId, { state: 'failed', last_error: error.message, due_at: new Date(now.getTime() + retryMilliseconds) });
  const studyId = await withOrganisation(ctx, async (trx) => {
    const found = await concerned(trx, name, payload);
    if (!found) return null;
    await updateRevisionFailure(trx, found.at, `${found.what}: a service behind Fourfold did not answer. It is tried again by itself within minutes.`);
    return found.at.studyId;
  });
  if (studyId !== null) await announce(ctx, studyId, { event: 'state', state: name === 'study.assess' ? 'assessing' : 'collecting' });
}
