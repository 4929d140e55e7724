import { z } from 'zod';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { timestampSchema } from '../api/names';
import { refuseWrongRoles, roleSetShape } from '../people/role-set';
import { roleSchema } from '../people/roles';

export const memberSchema = z.strictObject({
  id: z.string(), email: z.string(), roles: z.array(roleSchema), since: timestampSchema,
  codes: z.array(z.string()).nullable().meta({ description: 'Slugs of the codes an auditor may see; null: not limited.' }),
  until: timestampSchema.nullable().meta({ description: 'When an auditor’s access ends or ended.' }),
});
export type Member = z.infer<typeof memberSchema>;

export const updateMemberSchema = z.strictObject(roleSetShape).superRefine(refuseWrongRoles);
export type UpdateMemberInput = z.infer<typeof updateMemberSchema>;

export const listMembersContract = contract({
  method: 'GET', path: '/members', summary: 'Members of the organisation', access: 'organisation', status: 200, query: listQuerySchema,
  response: listOf(memberSchema),
});
export const updateMemberContract = contract({
  method: 'PATCH', path: '/members/{id}', summary: 'Change what a member may do', access: 'organisation', status: 200, body: updateMemberSchema,
  response: memberSchema,
});
export const removeMemberContract = contract({
  method: 'DELETE', path: '/members/{id}', summary: 'Remove a member, or leave', access: 'organisation', status: 204,
});
