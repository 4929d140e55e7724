import { updateUploadState } from '@/db/queries/uploads';
import { partCountOf } from '@/lib/domain/uploads/part-size';
import type { SignPartsInput } from '@/lib/domain/uploads/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { asReceiving } from './receiving-upload';
import { requireUpload } from './require-upload';

/** Addresses to which parts of an upload can be sent without any other credential, for a while. */
export async function signParts(ctx: MemberContext, id: string, { numbers }: SignPartsInput): Promise<{ parts: { number: number; url: string; expiresAt: string }[] }> {
  permit(ctx, 'work.write');
  const { upload, multipartId, bytes, partSize } = await withOrganisation(ctx, async (trx) => {
    const receiving = asReceiving(await requireUpload(ctx, trx, id));
    // What is still asked for is not abandoned.
    await updateUploadState(trx, ctx.organisation.id, receiving.upload.id, 'receiving', { last_activity_at: ctx.clock() });
    return receiving;
  });
  const count = partCountOf(bytes, partSize);
  const beyond = numbers.find((number) => number > count);
  if (beyond !== undefined) {
    throw new AppError('invalid', `Part ${beyond} is asked for; ${bytes} bytes in parts of ${partSize} are ${count}.`, { fields: [{ path: 'numbers', message: `At most ${count}.` }] });
  }
  const expiresAt = new Date(ctx.clock().getTime() + ctx.storage.partLifetimeSeconds * 1000).toISOString();
  return { parts: await Promise.all(numbers.map(async (number) => ({ number, url: await ctx.storage.signPart(upload.storage_key, multipartId, number), expiresAt }))) };
}
