import type { Selectable } from 'kysely';
import type { ApiTokens } from '@/db/schema.generated';
import { tokenScopeSchema } from '@/lib/domain/tokens/scopes';
import type { Token } from '@/lib/domain/tokens/schema';

/** Everything of a token but its secret. */
export function mapToken(row: Selectable<ApiTokens> & { code_slug: string | null }): Token {
  return {
    id: row.id, name: row.name, code: row.code_slug, scopes: tokenScopeSchema.array().parse(row.scopes),
    expiresAt: row.expires_at?.toISOString() ?? null, lastUsedAt: row.last_used_at?.toISOString() ?? null, createdAt: row.created_at.toISOString(),
  };
}
