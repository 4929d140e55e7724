import { z } from 'zod';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { labelSchema, nameSchema, slugSchema, timestampSchema } from '../api/names';

export const createCodeSchema = z.strictObject({ name: nameSchema, slug: slugSchema.optional() });
export type CreateCodeInput = z.infer<typeof createCodeSchema>;

export const codeSchema = z.strictObject({ id: z.string(), slug: z.string(), name: z.string(), createdAt: timestampSchema });
export type Code = z.infer<typeof codeSchema>;

export const releaseStateSchema = z.enum(['planned', 'current', 'withdrawn']);
export type ReleaseState = z.infer<typeof releaseStateSchema>;

export const createReleaseSchema = z.strictObject({ version: labelSchema, commit: z.string().trim().min(1).max(80).optional() });
export type CreateReleaseInput = z.infer<typeof createReleaseSchema>;

export const updateReleaseSchema = z.strictObject({ state: releaseStateSchema });
export type UpdateReleaseInput = z.infer<typeof updateReleaseSchema>;

export const releaseSchema = z.strictObject({
  id: z.string(), version: z.string(), commit: z.string().nullable(), state: releaseStateSchema,
  revision: z.number().int(), createdAt: timestampSchema,
});
export type Release = z.infer<typeof releaseSchema>;

export const createCodeContract = contract({
  method: 'POST', path: '/codes', summary: 'Make a code', access: 'organisation', status: 201, body: createCodeSchema, response: codeSchema,
});
export const listCodesContract = contract({
  method: 'GET', path: '/codes', summary: 'Codes', access: 'organisation', status: 200, query: listQuerySchema, response: listOf(codeSchema),
});
export const getCodeContract = contract({
  method: 'GET', path: '/codes/{code}', summary: 'One code', access: 'organisation', status: 200, response: codeSchema,
});
export const createReleaseContract = contract({
  method: 'POST', path: '/codes/{code}/releases', summary: 'Make a release', access: 'organisation', status: 201,
  body: createReleaseSchema, response: releaseSchema,
});
export const listReleasesContract = contract({
  method: 'GET', path: '/codes/{code}/releases', summary: 'Releases of a code, newest first', access: 'organisation', status: 200,
  query: listQuerySchema, response: listOf(releaseSchema),
});
export const updateReleaseContract = contract({
  method: 'PATCH', path: '/codes/{code}/releases/{version}', summary: 'Change the state of a release', access: 'organisation', status: 200,
  body: updateReleaseSchema, response: releaseSchema, conditional: true,
});
