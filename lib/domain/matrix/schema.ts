import { z } from 'zod';
import { contract } from '../api/contract';
import { timestampSchema } from '../api/names';
import { outcomeSchema, reasonCodeSchema } from '../assessment/schema';
import { caseKindSchema } from '../cases/definition';
import { releaseStateSchema } from '../codes/schema';
import { studyStateSchema } from '../studies/schema';

const nullableNumber = z.number().nullable();
export const standingSchema = z.enum(['stands', 'does-not-stand', 'incomplete', 'withdrawn']);
export type Standing = z.infer<typeof standingSchema>;

const lowestSchema = z.strictObject({ field: z.string(), norm: z.string(), observed: z.number(), formalOrder: z.number() });

const cellSchema = z.strictObject({
  release: z.string(),
  state: z.union([z.enum(['younger', 'not-run']), studyStateSchema]).meta({ description: '`younger`: the case came after the next release.' }),
  study: z.string().nullable(), revision: z.number().int().nullable(),
  outcome: outcomeSchema.nullable(), exact: z.boolean(), reasons: z.array(reasonCodeSchema),
  lowest: lowestSchema.nullable().meta({ description: 'Of the counting fields and norms, the lowest last observed order over its formal order.' }),
  gridsRead: z.number().int().nullable(), gridsPlanned: z.number().int().nullable(),
  waived: z.boolean(), signed: z.boolean(), assessedAt: timestampSchema.nullable(),
});
export type MatrixCell = z.infer<typeof cellSchema>;

const worseSchema = z.strictObject({
  case: z.string(), caseName: z.string(), field: z.string(), norm: z.string(), h: z.number(), before: z.string(), after: z.string(),
  orderBefore: nullableNumber, orderAfter: nullableNumber, errorBefore: z.number(), errorAfter: z.number(), ratio: z.number(),
});

export const matrixSchema = z.strictObject({
  code: z.strictObject({ id: z.string(), slug: z.string(), name: z.string() }),
  releases: z.array(z.strictObject({
    id: z.string(), version: z.string(), state: releaseStateSchema, createdAt: timestampSchema, standing: standingSchema,
    counts: z.strictObject({
      passOrExact: z.number().int(), meetsTarget: z.number().int(), fail: z.number().int(), inconclusive: z.number().int(),
      missesTarget: z.number().int(), notRun: z.number().int(), inProgress: z.number().int(),
    }),
  })).meta({ description: 'Oldest first.' }),
  cases: z.array(z.strictObject({
    id: z.string(), slug: z.string(), name: z.string(), kind: caseKindSchema, formalOrder: nullableNumber, target: nullableNumber,
    cells: z.array(cellSchema),
    trend: z.array(z.strictObject({ release: z.string(), error: z.number() })).meta({ description: 'Error of the leading counting norm on the finest grid that all studies share.' }),
  })),
  worse: z.array(worseSchema).meta({ description: 'What got worse between the last two releases: in order, or in error at equal spacing.' }),
});
export type Matrix = z.infer<typeof matrixSchema>;

export const getMatrixContract = contract({
  method: 'GET', path: '/codes/{code}/matrix', summary: 'Cases by releases', access: 'organisation', status: 200, response: matrixSchema,
});
