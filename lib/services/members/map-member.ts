import type { MemberRow } from '@/db/queries/memberships';
import type { Member } from '@/lib/domain/members/schema';
import { roleSchema } from '@/lib/domain/people/roles';

export function mapMember(row: MemberRow): Member {
  return {
    id: row.id, email: row.email, roles: roleSchema.array().parse(row.roles), since: row.created_at.toISOString(),
    codes: row.code_slugs, until: row.until?.toISOString() ?? null,
  };
}
