import { z } from 'zod';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { timestampSchema } from '../api/names';
import { mailStateSchema } from '../mail/mail-state';
import { refuseWrongRoles, roleSetShape } from '../people/role-set';
import { roleSchema } from '../people/roles';
import { emailSchema, meSchema, passwordSchema } from '../people/schema';


export const createInvitationSchema = z.strictObject({ email: emailSchema, ...roleSetShape }).superRefine(refuseWrongRoles);
export type CreateInvitationInput = z.infer<typeof createInvitationSchema>;

export const invitationStateSchema = z.enum(['pending', 'accepted', 'revoked', 'expired']);
export type InvitationState = z.infer<typeof invitationStateSchema>;

const invitedShape = {
  email: z.string(), roles: z.array(roleSchema), codes: z.array(z.string()).nullable().meta({ description: 'Slugs; null: every code.' }),
  until: timestampSchema.nullable(), state: invitationStateSchema, expiresAt: timestampSchema,
};
export const invitationSchema = z.strictObject({
  id: z.string(), ...invitedShape, invitedBy: z.string(), createdAt: timestampSchema,
  mail: z.strictObject({ id: z.string(), state: mailStateSchema, fault: z.string().nullable() }).nullable(),
});
export type Invitation = z.infer<typeof invitationSchema>;

export const openInvitationSchema = z.strictObject({
  organisation: z.string(), ...invitedShape, invitedBy: z.string(),
  hasAccount: z.boolean().meta({ description: 'Whether the address has an account already.' }),
});
export type OpenInvitation = z.infer<typeof openInvitationSchema>;

const tokenSchema = z.string().min(1).max(100);
export const acceptInvitationSchema = z.strictObject({
  token: tokenSchema,
  password: passwordSchema.optional().meta({ description: 'Of the new account; or of the account there is, where nobody is signed in.' }),
});
export type AcceptInvitationInput = z.infer<typeof acceptInvitationSchema>;

export const createInvitationContract = contract({
  method: 'POST', path: '/invitations', summary: 'Invite somebody by mail', access: 'organisation', status: 201, body: createInvitationSchema,
  response: invitationSchema, alsoRefuses: [429],
});
export const listInvitationsContract = contract({
  method: 'GET', path: '/invitations', summary: 'Invitations, newest first', access: 'organisation', status: 200, query: listQuerySchema,
  response: listOf(invitationSchema),
});
export const revokeInvitationContract = contract({
  method: 'DELETE', path: '/invitations/{id}', summary: 'Revoke an invitation', access: 'organisation', status: 204,
});
export const resendInvitationContract = contract({
  method: 'POST', path: '/invitations/{id}/resend', summary: 'Send an invitation again, with a new link', access: 'organisation', status: 200,
  response: invitationSchema, alsoRefuses: [429],
});
export const lookUpInvitationContract = contract({
  method: 'POST', path: '/invitations/lookup', summary: 'What an invitation offers', access: 'public', status: 200,
  body: z.strictObject({ token: tokenSchema }), response: openInvitationSchema, secret: true, alsoRefuses: [404],
});
export const acceptInvitationContract = contract({
  method: 'POST', path: '/invitations/accept', summary: 'Accept an invitation', access: 'public', status: 200,
  body: acceptInvitationSchema, response: meSchema, secret: true, alsoRefuses: [404],
});
