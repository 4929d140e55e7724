import type { GridRow } from '@/db/queries/grids';
import { findPlaceInLine } from '@/db/queries/waiting-jobs';
import type { Study } from '@/lib/domain/studies/schema';
import type { MemberContext } from '../context';
import type { Trx } from '../with-organisation';
import { stateOf } from './grid-definition';

/** Where the first file of the study that is not being read yet stands; null where none waits. */
export async function placeInLine(ctx: MemberContext, trx: Trx, grids: readonly GridRow[]): Promise<Study['waiting']> {
  const stored = grids.filter((row) => stateOf(row) === 'stored').map(({ id }) => id);
  const place = await findPlaceInLine(trx, ctx.organisation.id, stored);
  if (!place) return null;
  const now = ctx.clock().getTime();
  const secondsSince = (moment: Date) => Math.max(0, Math.round((now - moment.getTime()) / 1000));
  return { ahead: place.ahead, seconds: secondsSince(place.since), oldestSeconds: secondsSince(place.oldest), workerSeen: null };
}
