import { callApi } from '@/app/_components/api/call-api';
import { partSizeOf } from '@/lib/domain/uploads/part-size';
import { completeUploadContract, getUploadContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { abandonUpload } from './abandon-upload';
import type { Hashing } from './hash-file';
import { callAgain, type Line } from './line';
import { sendParts } from './send-parts';
import { sentBytes, type Sending, type TransferState } from './transfer';
import { keepRecent } from './transfer-rate';
import { forgetUpload, rememberUpload } from './upload-memory';

export interface SendPlace { organisation: string; study: string; line: Line; onChange: () => void }

/** Opens the upload, or finds out which parts of it are stored. */
async function openUpload({ organisation, study, line }: SendPlace, sending: Sending): Promise<string> {
  const { file, fingerprint, replaces, startKey, abort: { signal } } = sending;
  const present = sending.upload;
  if (present !== null) {
    const { parts } = await callAgain(line, signal, () => callApi(getUploadContract, { organisation, params: { id: present } }));
    sending.stored = new Map(parts.map(({ number, etag }) => [number, etag]));
    return present;
  }
  const { upload, createdAt } = await callAgain(line, signal, () => callApi(startUploadContract, {
    organisation, params: { id: study, label: sending.grid }, idempotencyKey: startKey,
    body: { filename: file.name, bytes: file.size, fingerprint, replaces },
  }));
  // Given up while it was being opened: nobody knew yet what to give up.
  if (sending.isDropped) {
    abandonUpload(organisation, upload);
    signal.throwIfAborted();
  }
  sending.upload = upload;
  sending.startedAt = createdAt;
  rememberUpload(upload);
  return upload;
}

/** Sends a file from where it stopped to its end. Rejects with a `SendFault`, or as the signal says. */
export async function sendFile(place: SendPlace, sending: Sending, hashing: Hashing): Promise<void> {
  const { organisation, line, onChange } = place;
  const { file, abort: { signal } } = sending;
  const enter = (state: TransferState) => {
    if (sending.state === state || signal.aborted) return;
    sending.state = state;
    onChange();
  };
  enter('sending');
  const upload = await openUpload(place, sending);
  sending.inFlight = new Map();
  onChange();
  await sendParts(line, {
    upload, file, partSize: partSizeOf(file.size), stored: sending.stored, signal,
    onStored: (number) => {
      sending.inFlight.delete(number);
      onChange();
    },
    onSent: (number, bytes) => {
      sending.inFlight.set(number, bytes);
      sending.samples = keepRecent(sending.samples, { at: line.now(), bytes: sentBytes(sending) });
      onChange();
    },
    onWaiting: (isWaiting) => enter(isWaiting ? 'waiting' : 'sending'),
  });
  enter('checking');
  const sha256 = await hashing.sha256;
  const parts = [...sending.stored].map(([number, etag]) => ({ number, etag }));
  await callAgain(line, signal, () => callApi(completeUploadContract, { organisation, params: { id: upload }, body: { parts, sha256 } }));
  forgetUpload(upload);
}
