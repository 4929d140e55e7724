import type { Selectable } from 'kysely';
import type { Organisations } from '@/db/schema.generated';
import type { Organisation } from '@/lib/domain/organisation/schema';

export function mapOrganisation({ id, slug, name, revision, created_at }: Selectable<Organisations>): Organisation {
  return { id, slug, name, revision, createdAt: created_at.toISOString() };
}
