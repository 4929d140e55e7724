import { listGrids } from '@/db/queries/grids';
import type { StudySnapshot } from '@/lib/domain/events/schema';
import type { StudyState } from '@/lib/domain/studies/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { watchMembership } from '../members/announce-membership';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { stateOf } from './grid-definition';
import { requireStudy } from './require-study';

const patienceMilliseconds = 3000;

async function readSnapshot(ctx: MemberContext, id: string): Promise<{ studyId: string; snapshot: StudySnapshot }> {
  return withOrganisation(ctx, async (trx) => {
    const { bound, at } = await requireStudy(ctx, trx, id);
    const grids = await listGrids(trx, at);
    const snapshot = {
      state: bound.state as StudyState, revision: bound.revision,
      grids: grids.map((row) => ({ label: row.label, state: stateOf(row), rowsRead: row.rows_read === null ? null : Number(row.rows_read) })),
    };
    return { studyId: at.studyId, snapshot };
  });
}

/**
 * Listens to a study first and then says how it stands, so that nothing falls between; `stop` ends the listening. `onLost`
 * is called when the roles of the listener have changed: whether they still may listen is asked anew.
 */
export async function watchStudy(ctx: MemberContext, id: string, listener: (message: string) => void, onLost: () => void): Promise<{ snapshot: StudySnapshot; stop: () => void }> {
  permit(ctx, 'work.read');
  // By the study's own id: the path may write it in capitals.
  const { studyId } = await readSnapshot(ctx, id);
  const subscription = Promise.all([ctx.events.subscribe(studyId, listener), watchMembership(ctx, ctx.organisation.id, ctx.userId, onLost)])
    .then((stops) => () => stops.forEach((each) => each()));
  const stop = await Promise.race([subscription, new Promise<null>((resolve) => setTimeout(resolve, patienceMilliseconds, null))]);
  if (stop === null) {
    subscription.then((late) => late(), () => undefined);
    throw new AppError('unavailable', 'Events cannot be told at the moment. Read the study again instead.');
  }
  try {
    const { snapshot } = await readSnapshot(ctx, id);
    return { snapshot, stop };
  } catch (error) {
    stop();
    throw error;
  }
}
