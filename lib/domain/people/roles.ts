import { z } from 'zod';

export const roleSchema = z.enum(['owner', 'engineer', 'reviewer', 'auditor']);
export type Role = z.infer<typeof roleSchema>;

export type Permission = 'work.read' | 'work.write' | 'tokens.manage' | 'people.read' | 'people.manage';

const permissionsOfRole: Record<Role, readonly Permission[]> = {
  owner: ['work.read', 'tokens.manage', 'people.read', 'people.manage'],
  engineer: ['work.read', 'work.write', 'tokens.manage', 'people.read'],
  reviewer: ['work.read', 'people.read'],
  // Auditors see signed things of granted codes only; there are none before the review exists.
  auditor: [],
};

/** Whether any of the roles carries the permission. */
export function rolesCarry(roles: readonly Role[], permission: Permission): boolean {
  return roles.some((role) => permissionsOfRole[role].includes(permission));
}
