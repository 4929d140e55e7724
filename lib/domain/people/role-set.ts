import { z } from 'zod';
import { roleSchema, type Role } from './roles';

/** What is wrong with a set of roles together with the limits of an auditor; null where nothing is. */
export function checkRoleSet({ roles, codes, until }: { roles: readonly Role[]; codes?: readonly string[] | undefined; until?: string | undefined }): { path: 'roles' | 'codes' | 'until'; message: string } | null {
  if (new Set(roles).size < roles.length) return { path: 'roles', message: 'A role is there twice. Expected each once.' };
  const isAuditor = roles.includes('auditor');
  if (isAuditor && roles.length > 1) return { path: 'roles', message: 'An auditor holds no other role. Choose auditor alone, or leave it out.' };
  if (isAuditor && until === undefined) return { path: 'until', message: 'An auditor’s access has an end. Say when.' };
  if (!isAuditor && until !== undefined) return { path: 'until', message: 'Only an auditor’s access has an end. Leave it out, or choose auditor alone.' };
  if (!isAuditor && codes !== undefined) return { path: 'codes', message: 'Only an auditor is limited to codes. Leave them out, or choose auditor alone.' };
  return null;
}

const roleSetRule = 'Each role once; an auditor holds no other role, has an end of access (until), and may be limited to codes.';

/** The members that say what somebody may do: of an invitation, and of a member. */
export const roleSetShape = {
  roles: z.array(roleSchema).min(1, 'Choose at least one role.').meta({ description: roleSetRule }),
  codes: z.array(z.string().min(1)).min(1).max(50).optional().meta({ description: 'Ids or slugs of the codes an auditor may see; absent: every code.' }),
  until: z.iso.datetime().optional().meta({ description: 'When an auditor’s access ends. ISO 8601, UTC.' }),
};

/** Adds the rule between the members; the printed document tells it in words. */
export function refuseWrongRoles(input: Parameters<typeof checkRoleSet>[0], context: z.RefinementCtx): void {
  const fault = checkRoleSet(input);
  if (fault) context.addIssue({ code: 'custom', path: [fault.path], message: fault.message });
}
