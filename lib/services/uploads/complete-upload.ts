import { updateUploadState } from '@/db/queries/uploads';
import { partCountOf } from '@/lib/domain/uploads/part-size';
import type { CompleteUploadInput, Upload } from '@/lib/domain/uploads/schema';
import { AppError } from '@/lib/errors';
import type { StoredPart } from '@/lib/platform/storage';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { announce } from '../studies/announce';
import { lockCollectingStudy } from '../studies/require-study';
import { withOrganisation } from '../with-organisation';
import { mapUpload } from './map-upload';
import { receiveFile } from './receive-file';
import { asReceiving, type ReceivingUpload } from './receiving-upload';
import { requireUpload, type LoadedUpload } from './require-upload';

const bare = (etag: string) => etag.replace(/^W\//, '').replaceAll('"', '');

function invalidParts(detail: string): AppError {
  return new AppError('invalid', detail, { fields: [{ path: 'parts', message: detail }] });
}

/** The parts stored are those stated, none is missing and together they have the size stated at the start. */
function checkParts({ bytes, partSize }: ReceivingUpload, stated: CompleteUploadInput['parts'], stored: StoredPart[]): void {
  const count = partCountOf(bytes, partSize);
  const beyond = stated.find(({ number }) => number < 1 || number > count);
  if (beyond) throw invalidParts(`Part ${beyond.number} is in the list; ${bytes} bytes in parts of ${partSize} are ${count}.`);
  if (new Set(stated.map(({ number }) => number)).size < stated.length) throw invalidParts('A part is in the list twice. Expected each once.');
  for (let number = 1; number <= count; number++) {
    const part = stored.find((candidate) => candidate.number === number);
    const claim = stated.find((candidate) => candidate.number === number);
    if (!part) throw invalidParts(`Part ${number} is not stored. Send it, then complete the upload again.`);
    if (!claim) throw invalidParts(`Part ${number} is not in the list.`);
    if (bare(claim.etag) !== bare(part.etag)) throw invalidParts(`Part ${number} was stored with ETag ${part.etag}; ${claim.etag} is stated.`);
  }
  const total = stored.reduce((sum, part) => sum + part.bytes, 0);
  if (total !== bytes) throw invalidParts(`${total} bytes are stored; ${bytes} were announced.`);
}

/** Joins the parts in storage. A call that was cut off after that finds the whole object and goes on from there. */
async function joinParts(ctx: MemberContext, receiving: ReceivingUpload, stated: CompleteUploadInput['parts']): Promise<void> {
  const { upload, multipartId, bytes } = receiving;
  const stored = await ctx.storage.findParts(upload.storage_key, multipartId);
  if (stored === null) {
    if (await ctx.storage.sizeOf(upload.storage_key) === bytes) return;
    throw new AppError('wrong-state', 'Storage no longer knows this upload. Start another one.');
  }
  checkParts(receiving, stated, stored);
  try {
    await ctx.storage.completeMultipart(upload.storage_key, multipartId, stated);
  } catch (error) {
    // Another call was quicker.
    if (await ctx.storage.sizeOf(upload.storage_key) !== bytes) throw error;
  }
}

/** What the file's SHA-256 is said to be, at the start or now; refused where the two differ. */
function statedSha256({ upload: { stated_sha256: atStart } }: LoadedUpload, now: string | undefined): string | null {
  if (atStart === null || now === undefined || atStart === now) return now ?? atStart;
  const detail = `The upload was started with SHA-256 ${atStart}; now ${now} is stated. Start another upload for another file.`;
  throw new AppError('invalid', detail, { fields: [{ path: 'sha256', message: detail }] });
}

/** Closes an upload: from here on it is kept, and read. Closing it again changes nothing. */
export async function completeUpload(ctx: MemberContext, id: string, { parts, sha256 }: CompleteUploadInput): Promise<Upload> {
  permit(ctx, 'work.write');
  const loaded = await withOrganisation(ctx, (trx) => requireUpload(ctx, trx, id));
  if (loaded.upload.state === 'stored') return mapUpload(loaded, []);
  const stated = statedSha256(loaded, sha256);
  await joinParts(ctx, asReceiving(loaded), parts);
  const completed = await withOrganisation(ctx, async (trx) => {
    await lockCollectingStudy(ctx, trx, loaded.grid.study_id);
    const present = await requireUpload(ctx, trx, id);
    if (present.upload.state === 'stored') return present;
    const { grid } = asReceiving(present);
    await updateUploadState(trx, ctx.organisation.id, id, 'receiving', { state: 'stored', stored_at: ctx.clock(), stated_sha256: stated });
    await receiveFile(trx, { organisationId: ctx.organisation.id, gridId: grid.id, uploadId: id });
    return requireUpload(ctx, trx, id);
  });
  await announce(ctx, completed.grid.study_id, { event: 'state', state: 'collecting', grid: completed.grid.label, gridState: 'stored' });
  return mapUpload(completed, []);
}
