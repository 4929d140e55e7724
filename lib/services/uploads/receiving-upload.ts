import { AppError } from '@/lib/errors';
import type { LoadedUpload } from './require-upload';

export interface ReceivingUpload extends LoadedUpload { multipartId: string; bytes: number; partSize: number }

/** The upload as one that still takes parts, or refused. */
export function asReceiving(loaded: LoadedUpload): ReceivingUpload {
  const { upload, isCurrent } = loaded;
  if (!isCurrent) throw new AppError('wrong-state', 'Another upload has taken the place of this one.');
  if (upload.state !== 'receiving' || upload.multipart_id === null || upload.part_size === null) {
    throw new AppError('wrong-state', 'The upload is complete and takes no more parts. To replace the file, start another upload.');
  }
  return { ...loaded, multipartId: upload.multipart_id, bytes: Number(upload.bytes), partSize: Number(upload.part_size) };
}
