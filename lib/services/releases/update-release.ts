import { updateReleaseState } from '@/db/queries/releases';
import type { Release, UpdateReleaseInput } from '@/lib/domain/codes/schema';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { staleRevision } from '../stale-revision';
import { withOrganisation } from '../with-organisation';
import { mapRelease } from './map-release';
import { requireRelease } from './require-release';

/** Several releases of a code may be current at once: users stay on older ones that are not withdrawn. */
export async function updateRelease(ctx: MemberContext, key: { code: string; version: string }, revision: number, input: UpdateReleaseInput): Promise<Release> {
  permit(ctx, 'work.write');
  return withOrganisation(ctx, async (trx) => {
    const code = await requireCode(ctx, trx, key.code);
    const release = await requireRelease(ctx, trx, code, key.version);
    const row = await updateReleaseState(trx, ctx.organisation.id, { id: release.id, revision }, input.state);
    if (!row) throw staleRevision('release', release.revision, revision);
    return mapRelease(row);
  });
}
