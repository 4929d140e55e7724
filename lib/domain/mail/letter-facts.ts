import { z } from 'zod';
import { roleSchema } from '../people/roles';

const roles = z.array(roleSchema);

/** What each kind of mail tells, without any secret: a link's token is made as the mail is sent. */
export const letterFactsSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('invitation'), organisation: z.string(), invitedBy: z.string(), roles, codes: z.array(z.string()).nullable(), until: z.string().nullable(),
  }),
  z.strictObject({ kind: z.literal('password-reset') }),
  z.strictObject({ kind: z.literal('password-changed'), at: z.string() }),
  z.strictObject({ kind: z.literal('membership-changed'), organisation: z.string(), slug: z.string(), by: z.string(), roles: roles.nullable(), until: z.string().nullable() }),
  z.strictObject({
    kind: z.literal('study-failed'), organisation: z.string(), slug: z.string(), study: z.string(), code: z.string(), release: z.string(), caseName: z.string(),
    statement: z.string(), failing: z.array(z.string()),
  }),
]);
export type LetterFacts = z.infer<typeof letterFactsSchema>;

export const mailKindSchema = z.enum(['invitation', 'password-reset', 'password-changed', 'membership-changed', 'study-failed']);
