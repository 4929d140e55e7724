import { createHash } from 'node:crypto';
import { Readable } from 'node:stream';
import { insertUpload } from '@/db/queries/uploads';
import { readReprDigest } from '@/lib/domain/uploads/repr-digest';
import type { Upload } from '@/lib/domain/uploads/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { noRoom, requireRoom, roomLeft } from '../storage/require-room';
import { announce } from '../studies/announce';
import { freezePlan } from '../studies/freeze-plan';
import { requireGrid } from '../studies/require-grid';
import { lockCollectingStudy } from '../studies/require-study';
import { withOrganisation, type Trx } from '../with-organisation';
import { abandonParts } from './abandon-parts';
import { giveUpReceiving } from './give-up-receiving';
import { mapUpload } from './map-upload';
import { receiveFile } from './receive-file';
import { requireFields } from './require-fields';
import { requireUpload } from './require-upload';
import { storageKey } from './storage-key';

const mostBytes = 100e6;

type Room = Awaited<ReturnType<typeof roomLeft>>;

interface DataInput {
  filename: string | undefined;
  body: AsyncIterable<Uint8Array>;
  /** As in the headers, null where there is none. */
  contentLength: string | null;
  reprDigest: string | null;
}

function tooLarge(): AppError {
  return new AppError('too-large', 'The file is over 100 MB. Send it in parts: POST …/upload.');
}

function statedDigest(field: string | null): string | null {
  if (field === null) return null;
  try {
    return readReprDigest(field);
  } catch (cause) {
    throw new AppError('bad-request', cause instanceof Error ? cause.message : 'Repr-Digest cannot be read.', { cause });
  }
}

/** The body, or 400 where the sender went away in the middle of it. */
async function* unbroken(body: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  try {
    yield* body;
  } catch (cause) {
    if (cause instanceof AppError) throw cause;
    throw new AppError('bad-request', 'The body broke off. Nothing was kept; send the file again.', { cause });
  }
}

/** Streams the body into storage, counting and hashing; what is short, damaged or too large is not kept. */
async function storeBody(ctx: MemberContext, { key, room }: { key: string; room: Room }, { body, contentLength, reprDigest }: DataInput): Promise<{ bytes: number; sha256: string }> {
  const stated = { bytes: contentLength === null ? null : Number(contentLength), sha256: statedDigest(reprDigest) };
  if (stated.bytes !== null && stated.bytes > mostBytes) throw tooLarge();
  if (stated.bytes !== null && stated.bytes > room.left) throw noRoom(ctx, room, stated.bytes);
  const hash = createHash('sha256');
  let bytes = 0;
  async function* counted(): AsyncGenerator<Uint8Array> {
    for await (const chunk of unbroken(body)) {
      bytes += chunk.length;
      if (bytes > mostBytes) throw tooLarge();
      if (bytes > room.left) throw noRoom(ctx, room, null);
      hash.update(chunk);
      yield chunk;
    }
    if (stated.bytes !== null && bytes !== stated.bytes) {
      throw new AppError('bad-request', `${bytes} bytes arrived; Content-Length says ${stated.bytes}. Nothing was kept; send the file again.`);
    }
  }
  await ctx.storage.put(key, Readable.from(counted(), { objectMode: false }));
  const sha256 = hash.digest('hex');
  if (stated.sha256 === null || stated.sha256 === sha256) return { bytes, sha256 };
  await ctx.storage.remove(key);
  throw new AppError('bad-request', `The body has SHA-256 ${sha256}; Repr-Digest says ${stated.sha256}. Nothing was kept; send the file again.`);
}

/** Takes a file in one call. The grid keeps what it had until the whole file is there. */
export async function putData(ctx: MemberContext, key: { id: string; label: string }, input: DataInput): Promise<Upload> {
  permit(ctx, 'work.write');
  const target = async (trx: Trx) => {
    const study = await lockCollectingStudy(ctx, trx, key.id);
    requireFields(study);
    const grid = await requireGrid(trx, study, key.label);
    return { study, grid, open: grid.state === 'receiving' ? grid.upload_id : null };
  };
  const { head, room } = await withOrganisation(ctx, async (trx) => {
    const { study: { head }, open } = await target(trx);
    return { head, room: await roomLeft(ctx, trx, open) };
  });
  const id = newId();
  const storage_key = storageKey(ctx.organisation.id, head.id, id);
  const { bytes, sha256 } = await storeBody(ctx, { key: storage_key, room }, input);
  const { loaded, replaced } = await withOrganisation(ctx, async (trx) => {
    const { study, grid, open } = await target(trx);
    await requireRoom(ctx, trx, { bytes, besides: open });
    await insertUpload(trx, {
      organisation_id: ctx.organisation.id, id, grid_id: grid.id, filename: input.filename ?? `${key.label}.csv`, bytes, sha256, storage_key,
      state: 'stored', stored_at: ctx.clock(), created_at: ctx.clock(), created_by: ctx.userId, token_id: ctx.token?.id ?? null,
    });
    const replaced = await giveUpReceiving(trx, grid);
    await receiveFile(trx, { organisationId: ctx.organisation.id, gridId: grid.id, uploadId: id });
    await freezePlan(trx, { ...study, now: ctx.clock() });
    return { loaded: await requireUpload(ctx, trx, id), replaced };
  }).catch(async (error: unknown) => {
    // Refused for sure, unlike a connection that broke off: nothing will ever name the object.
    if (error instanceof AppError) await ctx.storage.remove(storage_key);
    throw error;
  });
  if (replaced) await abandonParts(ctx, replaced);
  await announce(ctx, head.id, { event: 'state', state: 'collecting', grid: key.label, gridState: 'stored' });
  return mapUpload(loaded, []);
}
