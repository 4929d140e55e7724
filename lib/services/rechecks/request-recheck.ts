import { findAssessment } from '@/db/queries/assessments';
import { findRecheck, insertRecheck } from '@/db/queries/rechecks';
import type { Recheck } from '@/lib/domain/studies/recheck-schema';
import { AppError } from '@/lib/errors';
import { numericsVersion } from '@/lib/numerics/version';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { enqueueJob } from '../outbox/enqueue-job';
import { permit } from '../permit';
import { requireStudy } from '../studies/require-study';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { mapRecheck } from './map-recheck';

const underWay = 'A re-check of this study is under way. Wait for its result.';

/** Has the stored files of an assessed study read again and the result compared by value; nothing of the study changes. */
export async function requestRecheck(ctx: MemberContext, studyId: string): Promise<Recheck> {
  permit(ctx, 'work.read');
  return refuseDuplicate('rechecks_running_key', 'id', underWay, () => withOrganisation(ctx, async (trx) => {
    const { at, bound } = await requireStudy(ctx, trx, studyId);
    if (!(await findAssessment(trx, at))) throw new AppError('wrong-state', `The study is ${bound.state} and has no result to compare with.`);
    const id = newId();
    await insertRecheck(trx, {
      organisation_id: at.organisationId, id, study_id: at.studyId, study_revision: at.revision, numerics_version: numericsVersion, requested_by: ctx.userId, created_at: ctx.clock(),
    });
    await enqueueJob(trx, { organisationId: at.organisationId, job: 'study.recheck', subjectId: id, subjectRevision: null });
    const row = await findRecheck(trx, at.organisationId, id);
    if (!row) throw new Error(`Re-check ${id} is not there after it was made.`);
    return mapRecheck(row);
  }));
}
