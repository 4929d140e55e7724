import AwsS3, { type AwsBody } from '@uppy/aws-s3';
import Uppy, { type UppyFile } from '@uppy/core';
import { ApiProblem } from '@/app/_components/api/api-problem';
import { callApi } from '@/app/_components/api/call-api';
import { partSizeOf } from '@/lib/domain/uploads/part-size';
import { completeUploadContract, deleteUploadContract, getUploadContract, signPartsContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { keepRecent, transferRate, type Sample } from './transfer-rate';
import { forgetUpload, isRemembered, rememberUpload } from './upload-memory';

/** A file on its way from this browser to storage. `confirmed` counts whole parts that storage has answered for. */
export interface Transfer {
  grid: string; filename: string; bytes: number; confirmed: number; rate: number | null; secondsLeft: number | null;
  state: 'sending' | 'paused' | 'failed'; fault: string | null;
}

interface FileToSend { grid: string; file: File; halfSent: string | null }

export interface Uploader {
  subscribe: (listener: () => void) => () => void;
  transfers: () => ReadonlyMap<string, Transfer>;
  send: (files: readonly FileToSend[]) => Promise<void>;
  pauseOrResume: (grid: string) => void;
  sendAgain: (grid: string) => void;
  giveUp: (grid: string) => void;
}

type Meta = { grid: string; relativePath: string };
type SentFile = UppyFile<Meta, AwsBody>;

function wordFault(error: unknown): string {
  if (error instanceof ApiProblem) return error.problem.detail;
  return 'The connection to the store broke off.';
}

interface PartNotes { restart: (fileId: string) => void; confirm: (fileId: string, numbers: readonly number[]) => void }

/** The calls of the API behind a multipart upload straight to storage. */
function createS3Options(organisation: string, study: string, notes: PartNotes) {
  const target = (id: string) => ({ organisation, params: { id } });
  return {
    shouldUseMultipart: true as const,
    // Few at a time: each is counted once it is whole, and a slow line should show something soon.
    limit: 3,
    getChunkSize: ({ size }: { size: number }) => partSizeOf(size),
    createMultipartUpload: async (file: SentFile) => {
      notes.restart(file.id);
      const { upload } = await callApi(startUploadContract, {
        organisation, params: { id: study, label: file.meta.grid }, body: { filename: file.name, bytes: file.size ?? 0 },
      });
      if (file.data instanceof File) await rememberUpload(upload, file.data);
      return { uploadId: upload, key: upload };
    },
    signPart: async (_file: SentFile, { uploadId, partNumber }: { uploadId: string; partNumber: number }) => {
      const { parts } = await callApi(signPartsContract, { ...target(uploadId), body: { numbers: [partNumber] } });
      return { method: 'PUT' as const, url: parts[0]?.url ?? '' };
    },
    listParts: async (file: SentFile, { uploadId }: { uploadId?: string }) => {
      const { parts } = await callApi(getUploadContract, target(uploadId ?? ''));
      notes.confirm(file.id, parts.map(({ number }) => number));
      return parts.map(({ number, bytes, etag }) => ({ PartNumber: number, Size: bytes, ETag: etag }));
    },
    completeMultipartUpload: async (_file: SentFile, { uploadId, parts }: { uploadId: string; parts: { PartNumber?: number; ETag?: string }[] }) => {
      await callApi(completeUploadContract, { ...target(uploadId), body: { parts: parts.map(({ PartNumber, ETag }) => ({ number: PartNumber ?? 0, etag: ETag ?? '' })) } });
      forgetUpload(uploadId);
      return {};
    },
    abortMultipartUpload: async (_file: SentFile, { uploadId }: { uploadId?: string }) => {
      forgetUpload(uploadId ?? '');
      await callApi(deleteUploadContract, target(uploadId ?? ''));
    },
  };
}

function createUploader(organisation: string, study: string): Uploader {
  const uppy = new Uppy<Meta, AwsBody>({ autoProceed: true, allowMultipleUploadBatches: true });
  const listeners = new Set<() => void>();
  const samples = new Map<string, Sample[]>();
  const faults = new Map<string, string>();
  const parts = new Map<string, Set<number>>();
  let transfers: ReadonlyMap<string, Transfer> = new Map();

  const confirm = (id: string, numbers: readonly number[]) => parts.set(id, new Set([...(parts.get(id) ?? []), ...numbers]));
  const toTransfer = (file: SentFile): [string, Transfer] => {
    const bytes = file.size ?? 0;
    const rate = file.isPaused ? null : transferRate(samples.get(file.id) ?? []);
    const sent = typeof file.progress.bytesUploaded === 'number' ? file.progress.bytesUploaded : 0;
    return [file.meta.grid, {
      grid: file.meta.grid, filename: file.name, bytes, confirmed: Math.min(bytes, (parts.get(file.id)?.size ?? 0) * partSizeOf(bytes)),
      rate, secondsLeft: rate === null ? null : (bytes - sent) / rate,
      state: file.error ? 'failed' : file.isPaused ? 'paused' : 'sending', fault: file.error ? (faults.get(file.id) ?? file.error) : null,
    }];
  };
  uppy.use(AwsS3<Meta, AwsBody>, createS3Options(organisation, study, { confirm, restart: (id) => parts.delete(id) }));
  uppy.on('upload-progress', (file, progress) => {
    if (file && typeof progress.bytesUploaded === 'number') samples.set(file.id, keepRecent(samples.get(file.id) ?? [], { at: Date.now(), bytes: progress.bytesUploaded }));
  });
  uppy.on('s3-multipart:part-uploaded', (file, part) => { confirm(file.id, [part.PartNumber]); });
  uppy.on('upload-error', (file, error) => { if (file) faults.set(file.id, wordFault(error)); });
  uppy.on('complete', ({ successful }) => successful?.forEach((file) => uppy.removeFile(file.id)));
  uppy.on('state-update', () => {
    transfers = new Map(uppy.getFiles().filter((file) => !file.progress.uploadComplete).map(toTransfer));
    for (const listener of listeners) listener();
  });

  const fileOf = (grid: string) => uppy.getFiles().find((file) => file.meta.grid === grid);
  const giveUp = (grid: string) => {
    const file = fileOf(grid);
    if (file) uppy.removeFile(file.id);
  };
  return {
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    transfers: () => transfers,
    send: async (files) => {
      const known = await Promise.all(files.map(async ({ file, halfSent }) => (halfSent !== null && (await isRemembered(halfSent, file)) ? halfSent : null)));
      files.forEach(({ grid, file }, index) => {
        giveUp(grid);
        const id = uppy.addFile({ name: file.name, type: file.type, data: file, meta: { grid, relativePath: grid } });
        const upload = known[index];
        if (upload) uppy.setFileState(id, { s3Multipart: { uploadId: upload, key: upload } } as Partial<SentFile>);
      });
    },
    pauseOrResume: (grid) => {
      const file = fileOf(grid);
      if (!file) return;
      samples.delete(file.id);
      uppy.pauseResume(file.id);
    },
    sendAgain: (grid) => {
      const file = fileOf(grid);
      if (file) void uppy.retryUpload(file.id);
    },
    giveUp,
  };
}

const uploaders = new Map<string, Uploader>();

/** The one uploader of a study in this window: it goes on sending while other pages are looked at. */
export function uploaderOf(organisation: string, study: string): Uploader {
  const key = `${organisation} ${study}`;
  const present = uploaders.get(key);
  if (present) return present;
  const made = createUploader(organisation, study);
  uploaders.set(key, made);
  return made;
}
