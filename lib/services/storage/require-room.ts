import { lockStorageQuota, sumStoredBytes } from '@/db/queries/stored-bytes';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import type { Trx } from '../with-organisation';

/** Far more than anybody sends at once; what stays open is swept after a day. */
const mostOpen = 200;

/** Bytes the organisation may still store; files open and whole both count. The organisation is held until the transaction ends. */
export async function roomLeft(ctx: MemberContext, trx: Trx, besides: string | null = null): Promise<{ used: number; quota: number; left: number; open: number }> {
  const { storage_quota_bytes: own } = await lockStorageQuota(trx, ctx.organisation.id);
  const { stored, announced, open } = await sumStoredBytes(trx, ctx.organisation.id, besides);
  const quota = own === null ? ctx.storageQuotaBytes : Number(own);
  const used = Number(stored) + Number(announced);
  return { used, quota, left: quota - used, open };
}

export function noRoom(ctx: MemberContext, { used, quota }: { used: number; quota: number }, bytes: number | null): AppError {
  const file = bytes === null ? 'The file' : `The file has ${formatBytes(bytes)} and`;
  return new AppError('no-room', `${file} does not fit: ${ctx.organisation.name} uses ${formatBytes(used)} of ${formatBytes(quota)}. `
    + 'Give up uploads in progress under Storage, or have whoever runs this installation raise the quota.', {
    fields: [{ path: 'bytes', message: `${formatBytes(Math.max(0, quota - used))} are left.` }],
  });
}

/** Refuses what the organisation has no room for. Two that ask at once are answered one after the other. */
export async function requireRoom(ctx: MemberContext, trx: Trx, { bytes, besides = null }: { bytes: number; besides?: string | null }): Promise<void> {
  const room = await roomLeft(ctx, trx, besides);
  if (bytes > room.left) throw noRoom(ctx, room, bytes);
}

/** Refuses to open one more upload where too many are open. */
export async function requireOpenPlace(ctx: MemberContext, trx: Trx, besides: string | null): Promise<void> {
  const { open } = await sumStoredBytes(trx, ctx.organisation.id, besides);
  if (open < mostOpen) return;
  throw new AppError('wrong-state', `${open} uploads of ${ctx.organisation.name} are open; at most ${mostOpen} may be. Complete some, or give them up under Storage.`);
}
