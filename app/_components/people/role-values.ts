import type { Role } from '@/lib/domain/people/roles';

/** What somebody may do, as a form holds it. */
export interface RoleValues { owner: boolean; engineer: boolean; reviewer: boolean; auditor: boolean; until: string; codes: string[] }

export const engineerOnly: RoleValues = { owner: false, engineer: true, reviewer: false, auditor: false, until: '', codes: [] };

/** The same as the API takes it: an auditor's access ends with the day chosen, where the person who chooses is. */
export function roleSetOf({ owner, engineer, reviewer, auditor, until, codes }: RoleValues) {
  const chosen: Record<Role, boolean> = { owner, engineer, reviewer, auditor };
  const roles = (Object.keys(chosen) as Role[]).filter((role) => chosen[role]);
  if (!auditor) return { roles };
  return { roles, codes: codes.length === 0 ? undefined : codes, until: until === '' ? undefined : new Date(`${until}T23:59:59`).toISOString() };
}

export function roleValuesOf(member: { roles: readonly Role[]; until: string | null; codes: readonly string[] | null }): RoleValues {
  const has = (role: Role) => member.roles.includes(role);
  return {
    owner: has('owner'), engineer: has('engineer'), reviewer: has('reviewer'), auditor: has('auditor'),
    until: member.until?.slice(0, 10) ?? '', codes: [...(member.codes ?? [])],
  };
}

/** Faults of roles stand under the boxes. */
export const roleFieldOf = (path: string) => (path.startsWith('roles') ? 'engineer' : path.startsWith('codes') ? 'codes' : path);
