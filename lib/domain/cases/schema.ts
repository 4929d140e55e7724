import { z } from 'zod';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { nameSchema, slugSchema, timestampSchema } from '../api/names';
import { columnMappingSchema } from '../columns/column-mapping';
import { caseDefinitionSchema, caseKindSchema } from './definition';

const shape = caseDefinitionSchema.shape;

export const createCaseSchema = caseDefinitionSchema.extend({
  code: z.string().min(1), problem: z.string().min(1), name: nameSchema, slug: slugSchema.optional(), kind: caseKindSchema,
  columns: columnMappingSchema.optional(),
});
export type CreateCaseInput = z.infer<typeof createCaseSchema>;

export const updateCaseSchema = z.strictObject({
  name: nameSchema.optional(), problem: z.string().min(1).optional(),
  options: shape.options.unwrap().optional(), fields: shape.fields.unwrap().optional(), quantities: shape.quantities.unwrap().optional(),
  sampling: shape.sampling, sourceSampling: shape.sourceSampling, elements: shape.elements.unwrap().nullable().optional(), minimumGrids: shape.minimumGrids, boundaryBand: shape.boundaryBand,
  gridPlan: shape.gridPlan.unwrap().optional(), requirements: shape.requirements.unwrap().optional(),
});
export type UpdateCaseInput = z.infer<typeof updateCaseSchema>;

const linkSchema = z.strictObject({ id: z.string(), slug: z.string(), name: z.string() });

export const caseSchema = caseDefinitionSchema.extend({
  id: z.string(), slug: z.string(), name: z.string(), kind: caseKindSchema, revision: z.number().int(),
  code: linkSchema, problem: linkSchema, columns: columnMappingSchema.nullable(),
  createdAt: timestampSchema, changedAt: timestampSchema, changedBy: z.string().meta({ description: 'E-mail address of who made this revision.' }),
});
export type Case = z.infer<typeof caseSchema>;

const listCasesQuerySchema = listQuerySchema.extend({ code: z.string().optional(), problem: z.string().optional() });

export const createCaseContract = contract({
  method: 'POST', path: '/cases', summary: 'Make a case', access: 'organisation', status: 201, body: createCaseSchema, response: caseSchema,
});
export const listCasesContract = contract({
  method: 'GET', path: '/cases', summary: 'Cases', access: 'organisation', status: 200, query: listCasesQuerySchema, response: listOf(caseSchema),
});
export const getCaseContract = contract({
  method: 'GET', path: '/cases/{case}', summary: 'One case', access: 'organisation', status: 200, response: caseSchema,
});
export const updateCaseContract = contract({
  method: 'PATCH', path: '/cases/{case}', summary: 'Change a case: a new revision', access: 'organisation', status: 200,
  body: updateCaseSchema, response: caseSchema, conditional: true,
});
export const putColumnsContract = contract({
  method: 'PUT', path: '/cases/{case}/columns', summary: 'Map the columns of solver output; resumes uploads that wait for it',
  access: 'organisation', status: 200, body: columnMappingSchema, response: caseSchema,
});
