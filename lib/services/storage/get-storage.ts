import { findStorageQuota, listOpenUploads, listStudiesByBytes, sumStoredBytes } from '@/db/queries/stored-bytes';
import type { StorageUse } from '@/lib/domain/storage/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';

const mostStudies = 100;

/** What the organisation stores: in all, by study, and what is still being sent. A token limited to a code is shown that code's. */
export async function getStorage(ctx: MemberContext): Promise<StorageUse> {
  permit(ctx, 'work.read');
  const codeId = ctx.token?.codeId ?? null;
  return withOrganisation(ctx, async (trx) => {
    const { storage_quota_bytes: own } = await findStorageQuota(trx, ctx.organisation.id);
    const { stored, announced } = await sumStoredBytes(trx, ctx.organisation.id);
    const studies = await listStudiesByBytes(trx, ctx.organisation.id, { codeId, limit: mostStudies });
    const uploads = await listOpenUploads(trx, ctx.organisation.id, codeId);
    return {
      quota: own === null ? ctx.storageQuotaBytes : Number(own), used: Number(stored) + Number(announced), announced: Number(announced),
      studies: studies.map(({ id, code_name, version, case_name, bytes, files }) => ({ id, code: code_name, release: version, case: case_name, bytes: Number(bytes), files })),
      uploads: uploads.map((row) => ({
        id: row.id, study: row.study_id, grid: row.label, filename: row.filename, bytes: Number(row.bytes), createdBy: row.sender,
        createdAt: row.created_at.toISOString(), lastActivityAt: row.last_activity_at.toISOString(),
      })),
    };
  });
}
