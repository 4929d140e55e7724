import type { RejectionReason } from '@/lib/domain/uploads/rejection';
import { uploadStateSchema, type Upload, type UploadState } from '@/lib/domain/uploads/schema';
import type { StoredPart } from '@/lib/platform/storage';
import type { LoadedUpload } from './require-upload';

/** Once whole, an upload is as far as the grid that names it. */
function stateOfUpload({ upload, grid, isCurrent }: LoadedUpload): UploadState {
  if (upload.state === 'receiving' || !isCurrent) return uploadStateSchema.parse(upload.state);
  return uploadStateSchema.parse(grid.state);
}

export function mapUpload(loaded: LoadedUpload, parts: StoredPart[]): Upload {
  const { upload, grid, isCurrent } = loaded;
  return {
    id: upload.id, study: grid.study_id, grid: grid.label, filename: upload.filename, bytes: Number(upload.bytes), sha256: upload.sha256,
    state: stateOfUpload(loaded), partSize: upload.part_size === null ? null : Number(upload.part_size), parts,
    rowsRead: isCurrent && grid.rows_read !== null ? Number(grid.rows_read) : null,
    reasons: isCurrent ? grid.reasons as unknown as RejectionReason[] : [], fingerprint: upload.fingerprint,
    createdBy: upload.sender, createdAt: upload.created_at.toISOString(), lastActivityAt: upload.last_activity_at.toISOString(),
  };
}
