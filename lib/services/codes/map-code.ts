import type { CodeRow } from '@/db/queries/codes';
import type { Code } from '@/lib/domain/codes/schema';

export function mapCode(row: CodeRow): Code {
  return { id: row.id, slug: row.slug, name: row.name, createdAt: row.created_at.toISOString() };
}
