import { z } from 'zod';
import { regions } from '@/lib/numerics/assessment';
import { contract } from '../api/contract';
import { listOf, listQuerySchema } from '../api/lists';
import { timestampSchema } from '../api/names';
import { assessmentSchema, meshSchema, outcomeSchema, reasonCodeSchema } from '../assessment/schema';
import { caseDefinitionSchema, caseKindSchema } from '../cases/definition';
import { columnMappingSchema } from '../columns/column-mapping';
import { dimensionSchema, problemDefinitionSchema } from '../problems/schema';
import { rejectionReasonSchema } from '../uploads/rejection';
import { uploadStateSchema } from '../uploads/schema';
import { gridMapSchema } from './map-schema';
import { createStudySchema, gridInputSchema, refinementSchema, updateGridSchema } from './input';

export const studyStateSchema = z.enum([
  'collecting', 'assessing', 'assessment-failed', 'assessed', 'in-review', 'signed', 'superseded', 'withdrawn', 'abandoned',
]);
export type StudyState = z.infer<typeof studyStateSchema>;

export const gridStateSchema = z.enum(['expected', 'typed', ...uploadStateSchema.options]);
export type GridState = z.infer<typeof gridStateSchema>;

const rowsLeftOutSchema = z.number().int().optional().meta({ description: 'Rows that a VTK file marks as duplicates of another piece, as hidden or as refined; absent for none.' });

export const gridSchema = gridInputSchema.extend({
  state: gridStateSchema, revision: z.number().int(), excluded: z.string().nullable(), afterData: z.boolean(),
  upload: z.strictObject({
    id: z.string(), filename: z.string(), bytes: z.number().int(), sha256: z.string().nullable(),
    rowsRead: z.number().int().nullable(), rows: z.number().int().nullable(), rowsLeftOut: rowsLeftOutSchema, reasons: z.array(rejectionReasonSchema),
    createdBy: z.string().meta({ description: 'E-mail address of who sends or sent it.' }), createdAt: timestampSchema,
  }).nullable(),
});
export type Grid = z.infer<typeof gridSchema>;

const linkSchema = z.strictObject({ id: z.string(), slug: z.string(), name: z.string() });

export const studySchema = z.strictObject({
  id: z.string(),
  code: linkSchema,
  release: z.strictObject({ id: z.string(), version: z.string(), commit: z.string().nullable() }),
  case: linkSchema.extend({ kind: caseKindSchema, revision: z.number().int(), currentRevision: z.number().int(), columns: columnMappingSchema.nullable() }),
  problem: linkSchema.extend({ revision: z.number().int(), currentRevision: z.number().int() }),
  rule: z.strictObject({ revision: z.number().int() }),
  refinement: refinementSchema, dimension: dimensionSchema,
  state: studyStateSchema, stateSince: timestampSchema,
  revision: z.number().int(), currentRevision: z.number().int(),
  planFrozenAt: timestampSchema.nullable(),
  definitionAfterData: z.boolean().meta({ description: 'The case or its problem was changed after the first data, and this revision is bound to the change.' }),
  definition: caseDefinitionSchema.meta({ description: 'The case as this revision of the study is bound to it.' }),
  problemDefinition: problemDefinitionSchema,
  grids: z.array(gridSchema).meta({ description: 'Finest first where spacings are known.' }),
  waiting: z.strictObject({
    ahead: z.number().int().meta({ description: 'Files of the whole installation that were sent before the first of this study that waits.' }),
    seconds: z.number().int().meta({ description: 'How long that first one has waited.' }),
    oldestSeconds: z.number().int().meta({ description: 'How long the oldest of all has waited.' }),
    workerSeen: z.boolean().nullable().meta({ description: 'Whether a worker was there within 30 seconds; null where the queue cannot be asked.' }),
  }).nullable().meta({ description: 'Where files of this study wait to be read; null where none does.' }),
  assessment: assessmentSchema.nullable(),
  failure: z.string().nullable().meta({ description: 'Why the assessment could not be made.' }),
  createdBy: z.string(), createdAt: timestampSchema, revisedAt: timestampSchema,
});
export type Study = z.infer<typeof studySchema>;

const studySummarySchema = z.strictObject({
  id: z.string(), code: linkSchema, release: z.strictObject({ id: z.string(), version: z.string() }), case: linkSchema,
  state: studyStateSchema, revision: z.number().int(), outcome: outcomeSchema.nullable(), reasons: z.array(reasonCodeSchema),
  createdAt: timestampSchema, stateSince: timestampSchema,
});
export type StudySummary = z.infer<typeof studySummarySchema>;

export const outcomeAnswerSchema = z.strictObject({
  study: z.string(), revision: z.number().int(), code: z.string(), release: z.string(), case: z.string(),
  outcome: outcomeSchema.nullable(), reasons: z.array(reasonCodeSchema), assessment: assessmentSchema,
});
export type OutcomeAnswer = z.infer<typeof outcomeAnswerSchema>;

export const listStudiesQuerySchema = listQuerySchema.extend({
  case: z.string().optional(), release: z.string().optional(), state: studyStateSchema.optional(),
});
const outcomeQuerySchema = z.strictObject({
  wait: z.coerce.number().int().min(0).max(60).default(0).meta({ description: 'Seconds to wait for an outcome.' }),
  inconclusive: z.enum(['fail', 'skip']).default('fail'),
});
const revisionQuerySchema = z.strictObject({ revision: z.coerce.number().int().min(1).max(999_999_999).optional() });

const fieldResultSchema = z.strictObject({
  field: z.string(), L1: z.number(), L2: z.number(), Linf: z.number(),
  at: z.strictObject({ x: z.number(), y: z.number().optional(), z: z.number().optional() }),
  signedMean: z.number(), exact: z.strictObject({ L1: z.number(), L2: z.number(), Linf: z.number() }),
  minimum: z.number(), maximum: z.number(), count: z.number().int(), significantDigits: z.number().int().nullable(),
  datum: z.strictObject({ kind: z.enum(['mean', 'scale', 'rigid']), value: z.number() }).optional()
    .meta({ description: 'What was taken out of the field before its norms: the constant, the factor it was multiplied by, or its component of the rigid motion at the centre.' }),
});
const gradientResultSchema = z.strictObject({ field: z.string(), H1: z.number(), exactH1: z.number() });
const regionResultSchema = z.strictObject({
  region: z.enum(regions), rows: z.number().int(), weightSum: z.number(), fields: z.array(fieldResultSchema), gradients: z.array(gradientResultSchema),
});
const gridResultSchema = z.strictObject({
  label: z.string(), upload: z.string(), sha256: z.string(), rows: z.number().int(), rowsLeftOut: rowsLeftOutSchema, weightSum: z.number(), equalWeights: z.boolean(),
  mapping: columnMappingSchema, fields: z.array(fieldResultSchema),
  solutions: z.array(z.strictObject({
    field: z.string(), L1: z.number(), L2: z.number(), Linf: z.number(), minimum: z.number(), maximum: z.number(), count: z.number().int(), significantDigits: z.number().nullable(),
  })).optional().meta({ description: 'Norms of the fields themselves, where the problem has no exact solution.' }),
  gradients: z.array(gradientResultSchema).meta({ description: 'H1 seminorms, of fields with columns of their gradient.' }),
  regions: z.array(regionResultSchema).meta({ description: 'The same of parts of the domain, each divided by its own sum of weights; none where nothing tells the boundary.' }),
  maps: z.array(gridMapSchema).meta({ description: 'Maps of the largest errors, by field and plane; their bins are called for one by one.' }),
  mesh: meshSchema.optional(),
  motion: z.strictObject({ centre: z.array(z.number()), translation: z.array(z.number()), rotation: z.array(z.number()) }).optional()
    .meta({ description: 'The small rigid motion taken out of a displacement: translation + rotation × (x − centre), with one angle in two dimensions and a vector in three, in radians.' }),
  numericsVersion: z.string(),
});
export type GridResult = z.infer<typeof gridResultSchema>;

export const createStudyContract = contract({
  method: 'POST', path: '/studies', summary: 'Make a study: a case on a release with its grids', access: 'organisation', status: 201,
  body: createStudySchema, response: studySchema,
});
export const listStudiesContract = contract({
  method: 'GET', path: '/studies', summary: 'Studies', access: 'organisation', status: 200, query: listStudiesQuerySchema, response: listOf(studySummarySchema),
});
export const getStudyContract = contract({
  method: 'GET', path: '/studies/{id}', summary: 'One study, the latest revision or a named one', access: 'organisation', status: 200,
  query: revisionQuerySchema, response: studySchema,
});
export const addGridContract = contract({
  method: 'POST', path: '/studies/{id}/grids', summary: 'Add a grid while collecting', access: 'organisation', status: 201,
  body: gridInputSchema, response: gridSchema,
});
export const updateGridContract = contract({
  method: 'PATCH', path: '/studies/{id}/grids/{label}', summary: 'Change a grid or leave it out, while collecting', access: 'organisation', status: 200,
  body: updateGridSchema, response: gridSchema, conditional: true,
});
export const reviseStudyContract = contract({
  method: 'POST', path: '/studies/{id}/revisions', summary: 'Open a new revision', access: 'organisation', status: 201, response: studySchema,
});
export const assessStudyContract = contract({
  method: 'POST', path: '/studies/{id}/assess', summary: 'Run the assessment again', access: 'organisation', status: 202, response: studySchema,
});
const notAssessedYet = { description: 'Not assessed yet', schema: z.strictObject({ state: studyStateSchema }) };
export const getOutcomeContract = contract({
  method: 'GET', path: '/studies/{id}/outcome', summary: 'The outcome, as JSON or JUnit XML', access: 'organisation', status: 200,
  query: outcomeQuerySchema, response: outcomeAnswerSchema,
  alsoAnswers: {
    200: { description: 'The outcome; JUnit XML where `Accept` asks for it', text: ['application/xml'] }, 202: notAssessedYet,
    409: { description: 'A grid is rejected or the assessment failed' },
  },
});
export const getOutcomeXmlContract = contract({
  method: 'GET', path: '/studies/{id}/outcome.xml', summary: 'The outcome as JUnit XML', access: 'organisation', status: 200,
  query: outcomeQuerySchema, alsoAnswers: { 200: { description: 'JUnit XML', text: ['application/xml'] }, 202: notAssessedYet },
});
export const getEventsContract = contract({
  method: 'GET', path: '/studies/{id}/events', summary: 'Server-sent events: snapshot, progress, state', access: 'organisation', status: 200,
  alsoAnswers: { 200: { description: 'Server-sent events', text: ['text/event-stream'] } },
});
export const getGridResultContract = contract({
  method: 'GET', path: '/studies/{id}/grids/{label}/result', summary: 'Norms and statistics of one grid', access: 'organisation', status: 200,
  query: revisionQuerySchema, response: gridResultSchema,
});
