import { updateUploadState } from '@/db/queries/uploads';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { announce } from '../studies/announce';
import { lockCollectingStudy } from '../studies/require-study';
import { withOrganisation } from '../with-organisation';
import { abandonParts } from './abandon-parts';
import { asReceiving } from './receiving-upload';
import { requireUpload } from './require-upload';
import { takeBackUpload } from './take-back-upload';

/** Gives up an upload that is not complete. The grid goes back to the file it had before, or to having none. */
export async function deleteUpload(ctx: MemberContext, id: string): Promise<void> {
  permit(ctx, 'work.write');
  const { upload, grid } = await withOrganisation(ctx, async (trx) => {
    const { grid: { study_id } } = await requireUpload(ctx, trx, id);
    const study = await lockCollectingStudy(ctx, trx, study_id);
    const loaded = asReceiving(await requireUpload(ctx, trx, id));
    await updateUploadState(trx, ctx.organisation.id, id, 'receiving', { state: 'given-up' });
    await takeBackUpload(trx, { at: study.at, grid: loaded.grid, uploadId: id, now: ctx.clock() });
    return loaded;
  });
  await abandonParts(ctx, upload);
  await announce(ctx, grid.study_id, { event: 'state', state: 'collecting', grid: grid.label });
}
