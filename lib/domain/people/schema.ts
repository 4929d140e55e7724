import { z } from 'zod';
import { nameSchema } from '../api/names';
import { contract } from '../api/contract';
import { tokenScopeSchema } from '../tokens/scopes';
import { roleSchema } from './roles';

export const emailSchema = z.email('Expected an e-mail address, such as name@example.org.').trim().toLowerCase().max(254);
export const passwordSchema = z.string().min(10, 'Expected at least 10 characters.').max(200);

export const signUpSchema = z.strictObject({ email: emailSchema, password: passwordSchema, organisation: nameSchema });
export type SignUpInput = z.infer<typeof signUpSchema>;

export const signInSchema = z.strictObject({ email: emailSchema, password: z.string().min(1, 'Type the password.').max(200) });
export type SignInInput = z.infer<typeof signInSchema>;

const membershipSchema = z.strictObject({ id: z.string(), slug: z.string(), name: z.string(), roles: z.array(roleSchema) });
export const meSchema = z.strictObject({
  id: z.string(),
  email: z.string(),
  organisations: z.array(membershipSchema),
  token: z.strictObject({ id: z.string(), name: z.string(), code: z.string().nullable(), scopes: z.array(tokenScopeSchema) }).nullable(),
});
export type Me = z.infer<typeof meSchema>;

export const signUpContract = contract({
  method: 'POST', path: '/accounts', summary: 'Sign up: an account and its organisation', access: 'public', status: 201,
  body: signUpSchema, response: meSchema, secret: true,
});
export const signInContract = contract({
  method: 'POST', path: '/session', summary: 'Sign in', access: 'public', status: 200, body: signInSchema, response: meSchema, secret: true,
});
export const signOutContract = contract({ method: 'DELETE', path: '/session', summary: 'Sign out', access: 'signed-in', status: 204 });
export const signOutEverywhereContract = contract({
  method: 'DELETE', path: '/sessions', summary: 'Sign out everywhere', access: 'signed-in', status: 204,
});
export const meContract = contract({ method: 'GET', path: '/me', summary: 'Who is calling', access: 'signed-in', status: 200, response: meSchema });

export const createOrganisationSchema = z.strictObject({ name: nameSchema });
export type CreateOrganisationInput = z.infer<typeof createOrganisationSchema>;
export const createOrganisationContract = contract({
  method: 'POST', path: '/organisations', summary: 'Make another organisation, as its owner and engineer', access: 'signed-in', status: 201,
  body: createOrganisationSchema, response: membershipSchema,
});
