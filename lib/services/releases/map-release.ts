import type { ReleaseRow } from '@/db/queries/releases';
import { releaseStateSchema, type Release } from '@/lib/domain/codes/schema';

export function mapRelease(row: ReleaseRow): Release {
  return {
    id: row.id, version: row.version, commit: row.commit, state: releaseStateSchema.parse(row.state), revision: row.revision,
    createdAt: row.created_at.toISOString(),
  };
}
