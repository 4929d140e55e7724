import { z } from 'zod';
import { contract } from '../api/contract';
import { timestampSchema } from '../api/names';

const valueSchema = z.union([z.string(), z.number(), z.boolean(), z.null()]);

export const recheckSchema = z.strictObject({
  id: z.string(), study: z.string(), revision: z.number().int(), state: z.enum(['running', 'done']),
  result: z.enum(['identical', 'within-1e-10', 'not-reproduced']).nullable(),
  largestDifference: z.number().nullable().meta({ description: 'Relative to the larger of the two values.' }),
  differences: z.array(z.strictObject({ path: z.string(), before: valueSchema, after: valueSchema })).meta({ description: 'The first 20 beyond 1e-10.' }),
  numericsVersion: z.string(), requestedBy: z.string(), createdAt: timestampSchema, finishedAt: timestampSchema.nullable(),
});
export type Recheck = z.infer<typeof recheckSchema>;

export const requestRecheckContract = contract({
  method: 'POST', path: '/studies/{id}/rechecks', summary: 'Read the stored files of a study again and compare the result by value', access: 'organisation', status: 201,
  response: recheckSchema,
});
export const listRechecksContract = contract({
  method: 'GET', path: '/studies/{id}/rechecks', summary: 'Re-checks of a study, the newest first, at most 20', access: 'organisation', status: 200,
  response: z.strictObject({ items: z.array(recheckSchema) }),
});
