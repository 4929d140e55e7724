import { listGrids } from '@/db/queries/grids';
import { updateRevisionState } from '@/db/queries/study-revisions';
import type { Study } from '@/lib/domain/studies/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { enqueueJob } from '../outbox/enqueue-job';
import { permit } from '../permit';
import { withOrganisation, type Trx } from '../with-organisation';
import { announce } from './announce';
import { mapStudy } from './map-study';
import { lockStudy, requireStudy, type LoadedStudy } from './require-study';
import { settleStudy } from './settle-study';

async function assessCollecting(trx: Trx, { at }: LoadedStudy, now: Date): Promise<void> {
  if (await settleStudy(trx, at, now)) return;
  const open = (await listGrids(trx, at)).filter((grid) => grid.excluded === null && !['read', 'typed'].includes(grid.state));
  if (open.length === 0) throw new AppError('wrong-state', 'Every grid is left out. Take one back in, or add one.');
  throw new AppError('wrong-state', `Still open: ${open.map(({ label, state }) => `${label} (${state})`).join(', ')}. Send their files, or leave them out with a reason.`, {
    fields: open.map(({ label, state }) => ({ path: `grids.${label}`, message: `The grid is ${state}.` })),
  });
}

/** Assesses what is there, or once more what failed to be assessed. */
export async function requestAssessment(ctx: MemberContext, id: string): Promise<Study> {
  permit(ctx, 'work.write');
  const study = await withOrganisation(ctx, async (trx) => {
    const loaded = await lockStudy(ctx, trx, id);
    const { bound, at } = loaded;
    const now = ctx.clock();
    if (bound.state === 'collecting') await assessCollecting(trx, loaded, now);
    else if (await updateRevisionState(trx, at, ['assessment-failed'], { state: 'assessing', since: now })) {
      await enqueueJob(trx, { organisationId: at.organisationId, job: 'study.assess', subjectId: at.studyId, subjectRevision: at.revision });
    } else if (bound.state !== 'assessing') {
      throw new AppError('wrong-state', `The study is ${bound.state}, and an assessment never changes. Open a new revision to have it assessed again.`);
    }
    return mapStudy(ctx, trx, await requireStudy(ctx, trx, id));
  });
  await announce(ctx, study.id, { event: 'state', state: study.state });
  return study;
}
