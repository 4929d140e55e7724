import { z } from 'zod';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { timestampSchema } from '../api/names';
import { mailKindSchema } from './letter-facts';
import { mailStateSchema } from './mail-state';

export const mailSchema = z.strictObject({
  id: z.string(), to: z.string(), kind: mailKindSchema, state: mailStateSchema,
  fault: z.string().nullable().meta({ description: 'Why it did not go out, or why that is not known.' }),
  createdAt: timestampSchema, claimedAt: timestampSchema.nullable(), sentAt: timestampSchema.nullable(),
});
export type Mail = z.infer<typeof mailSchema>;

export const listMailsContract = contract({
  method: 'GET', path: '/mails', summary: 'Mails of the organisation, newest first', access: 'organisation', status: 200,
  query: listQuerySchema.extend({ state: mailStateSchema.optional() }), response: listOf(mailSchema),
});
export const resendMailContract = contract({
  method: 'POST', path: '/mails/{id}/resend', summary: 'Send a mail again that did not, or may not have gone out', access: 'organisation', status: 200,
  response: mailSchema,
});
