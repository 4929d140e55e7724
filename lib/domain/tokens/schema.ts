import { z } from 'zod';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { nameSchema, timestampSchema } from '../api/names';
import { tokenScopeSchema } from './scopes';

export const createTokenSchema = z.strictObject({
  name: nameSchema,
  code: z.string().min(1).optional().meta({ description: 'Id or slug of the only code the token reaches.' }),
  scopes: z.array(tokenScopeSchema).min(1),
  expiresAt: timestampSchema.optional(),
});
export type CreateTokenInput = z.infer<typeof createTokenSchema>;

export const tokenSchema = z.strictObject({
  id: z.string(),
  name: z.string(),
  code: z.string().nullable(),
  scopes: z.array(tokenScopeSchema),
  expiresAt: timestampSchema.nullable(),
  lastUsedAt: timestampSchema.nullable(),
  createdAt: timestampSchema,
});
export type Token = z.infer<typeof tokenSchema>;

const newTokenSchema = tokenSchema.extend({ token: z.string().meta({ description: 'The secret, shown this once.' }) });
export type NewToken = z.infer<typeof newTokenSchema>;

export const createTokenContract = contract({
  method: 'POST', path: '/tokens', summary: 'Make a token', access: 'organisation', status: 201, body: createTokenSchema,
  response: newTokenSchema, secret: true,
});
export const listTokensContract = contract({
  method: 'GET', path: '/tokens', summary: 'Own tokens', access: 'organisation', status: 200, query: listQuerySchema, response: listOf(tokenSchema),
});
export const deleteTokenContract = contract({
  method: 'DELETE', path: '/tokens/{id}', summary: 'Withdraw a token', access: 'organisation', status: 204,
});
