import { insertAssessment } from '@/db/queries/assessments';
import { listGrids } from '@/db/queries/grids';
import { findStudy } from '@/db/queries/studies';
import { findBoundRevision, updateRevisionState, type RevisionKey } from '@/db/queries/study-revisions';
import { json } from '@/db/json';
import { newId } from '../keys';
import type { JobContext } from '../outbox/job-context';
import type { GridReader } from '../reading/grid-reader';
import { announce } from '../studies/announce';
import { withOrganisation } from '../with-organisation';
import { computeAssessment } from './compute-assessment';
import { readDifferences } from './read-differences';
import { queueFailMails } from './queue-fail-mails';

/** Computes the outcome of a revision that waits for it and keeps it for good; a second run finds it done. */
export async function assessStudy(ctx: JobContext, { studyId, revision }: { studyId: string; revision: number }, reader: GridReader): Promise<void> {
  const at: RevisionKey = { organisationId: ctx.organisation.id, studyId, revision };
  const loaded = await withOrganisation(ctx, async (trx) => {
    const head = await findStudy(trx, ctx.organisation.id, studyId);
    const bound = await findBoundRevision(trx, at);
    return head && bound?.state === 'assessing' ? { head, bound, rows: await listGrids(trx, at) } : null;
  });
  if (!loaded) return;
  const read = await readDifferences(ctx, loaded, reader);
  const computed = read.ok ? computeAssessment(loaded, read.differences) : read;
  const now = ctx.clock();
  const isChanged = await withOrganisation(ctx, async (trx) => {
    if (!computed.ok) return updateRevisionState(trx, at, ['assessing'], { state: 'assessment-failed', failure: computed.reason, since: now });
    const { assessment } = computed;
    await insertAssessment(trx, {
      organisation_id: ctx.organisation.id, id: newId(), study_id: studyId, study_revision: revision, outcome: assessment.outcome,
      body: json(assessment), inputs_sha256: assessment.inputsSha256, numerics_version: assessment.numericsVersion,
    });
    const isFirst = await updateRevisionState(trx, at, ['assessing'], { state: 'assessed', since: now });
    if (isFirst && assessment.outcome === 'fail') await queueFailMails(ctx, trx, { at, head: loaded.head, caseName: loaded.bound.case_name, assessment });
    return isFirst;
  });
  if (isChanged) await announce(ctx, studyId, { event: 'state', state: computed.ok ? 'assessed' : 'assessment-failed' });
}
