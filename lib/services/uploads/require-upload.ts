import { findGrid, findGridOfUpload } from '@/db/queries/grids';
import { findUpload, type SentUpload } from '@/db/queries/uploads';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import { requireStudy } from '../studies/require-study';
import type { Trx } from '../with-organisation';

type UploadGrid = NonNullable<Awaited<ReturnType<typeof findGrid>>>;
export interface LoadedUpload { upload: SentUpload; grid: UploadGrid; isCurrent: boolean }

/** An upload with the grid that names it, else the one it was made for; 404 also where it was given up. */
export async function requireUpload(ctx: MemberContext, trx: Trx, id: string): Promise<LoadedUpload> {
  const key = keyOf(id).id;
  const upload = key === null ? undefined : await findUpload(trx, ctx.organisation.id, key);
  if (!upload || upload.state === 'given-up') throw new AppError('not-found', `There is no upload “${id}”.`);
  const named = await findGridOfUpload(trx, ctx.organisation.id, upload.id);
  const grid = named ?? await findGrid(trx, ctx.organisation.id, upload.grid_id);
  if (!grid) throw new AppError('not-found', `There is no upload “${id}”.`);
  await requireStudy(ctx, trx, grid.study_id);
  return { upload, grid, isCurrent: named !== undefined };
}
