import { updateGrid } from '@/db/queries/grids';
import { findStoredUpload, updateUploadState } from '@/db/queries/uploads';
import { json } from '@/db/json';
import { isTyped } from '@/lib/domain/studies/check-grid';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { announce } from '../studies/announce';
import { definitionOf } from '../studies/grid-definition';
import { lockCollectingStudy } from '../studies/require-study';
import { settleStudy } from '../studies/settle-study';
import { withOrganisation } from '../with-organisation';
import { abandonParts } from './abandon-parts';
import { receiveFile } from './receive-file';
import { asReceiving } from './receiving-upload';
import { requireUpload } from './require-upload';

/** Gives up an upload that is not complete. The grid goes back to the file it had before, or to having none. */
export async function deleteUpload(ctx: MemberContext, id: string): Promise<void> {
  permit(ctx, 'work.write');
  const { upload, grid } = await withOrganisation(ctx, async (trx) => {
    const { grid: { study_id } } = await requireUpload(ctx, trx, id);
    const study = await lockCollectingStudy(ctx, trx, study_id);
    const loaded = asReceiving(await requireUpload(ctx, trx, id));
    const { grid } = loaded;
    await updateUploadState(trx, ctx.organisation.id, id, 'receiving', { state: 'given-up' });
    const before = await findStoredUpload(trx, ctx.organisation.id, grid, id);
    if (before) await receiveFile(trx, { organisationId: ctx.organisation.id, gridId: grid.id, uploadId: before.id });
    else {
      await updateGrid(trx, ctx.organisation.id, grid.id, {
        state: isTyped(definitionOf(grid)) ? 'typed' : 'expected', upload_id: null, rows_read: null, reasons: json([]),
      });
      await settleStudy(trx, study.at, ctx.clock());
    }
    return loaded;
  });
  await abandonParts(ctx, upload);
  await announce(ctx, grid.study_id, { event: 'state', state: 'collecting', grid: grid.label });
}
