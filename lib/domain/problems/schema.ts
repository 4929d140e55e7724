import { z } from 'zod';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { nameSchema, slugSchema, timestampSchema } from '../api/names';

const identifierSchema = z.string().regex(/^[A-Za-z][A-Za-z0-9_]{0,39}$/, 'Expected a letter, then letters, digits or underscores, such as nu.');
const expressionSchema = z.string().trim().min(1).max(4000);
const intervalSchema = z.tuple([z.number(), z.number()]).meta({ description: '[from, to] with from below to.' });
export const dimensionSchema = z.union([z.literal(1), z.literal(2), z.literal(3)]);

export const equationSchema = z.enum([
  'none', 'poisson', 'heat', 'heat_nonlinear', 'advection_diffusion_reaction', 'burgers', 'wave', 'helmholtz',
  'incompressible_navier_stokes', 'compressible_euler', 'compressible_navier_stokes', 'linear_elasticity', 'custom',
]);
export type Equation = z.infer<typeof equationSchema>;

/** What of a problem is kept in revisions. */
export const problemDefinitionSchema = z.strictObject({
  equation: equationSchema,
  form: z.string().trim().max(120).optional(),
  dimension: dimensionSchema,
  unsteady: z.boolean().default(false),
  constants: z.record(identifierSchema, z.union([z.number(), expressionSchema])).default({}),
  exact: z.record(identifierSchema, expressionSchema).optional(),
  domain: z.partialRecord(z.enum(['x', 'y', 'z']), intervalSchema).optional(),
  residual: z.record(identifierSchema, expressionSchema).optional(),
});
export type ProblemDefinition = z.infer<typeof problemDefinitionSchema>;

export const createProblemSchema = problemDefinitionSchema.extend({ name: nameSchema, slug: slugSchema.optional() });
export type CreateProblemInput = z.infer<typeof createProblemSchema>;

export const updateProblemSchema = createProblemSchema.omit({ slug: true }).extend({
  unsteady: z.boolean(), constants: problemDefinitionSchema.shape.constants.unwrap(),
}).partial();
export type UpdateProblemInput = z.infer<typeof updateProblemSchema>;

export const problemSchema = problemDefinitionSchema.extend({
  unsteady: z.boolean(), constants: problemDefinitionSchema.shape.constants.unwrap(),
  id: z.string(), slug: z.string(), name: z.string(), revision: z.number().int(),
  createdAt: timestampSchema, changedAt: timestampSchema, changedBy: z.string().meta({ description: 'E-mail address of who made this revision.' }),
  usedBy: z.array(z.strictObject({ id: z.string(), slug: z.string(), name: z.string() })).meta({ description: 'Cases on this problem.' }),
});
export type Problem = z.infer<typeof problemSchema>;

export const createProblemContract = contract({
  method: 'POST', path: '/problems', summary: 'Make a problem', access: 'organisation', status: 201, body: createProblemSchema, response: problemSchema,
});
export const listProblemsContract = contract({
  method: 'GET', path: '/problems', summary: 'Problems', access: 'organisation', status: 200, query: listQuerySchema, response: listOf(problemSchema),
});
export const getProblemContract = contract({
  method: 'GET', path: '/problems/{problem}', summary: 'One problem', access: 'organisation', status: 200, response: problemSchema,
});
export const updateProblemContract = contract({
  method: 'PATCH', path: '/problems/{problem}', summary: 'Change a problem: a new revision', access: 'organisation', status: 200,
  body: updateProblemSchema, response: problemSchema, conditional: true,
});
