import { z } from 'zod';
import { contract } from '../api/contract';
import { timestampSchema } from '../api/names';
import { columnMappingSchema } from '../columns/column-mapping';
import { decimalMarkSchema, delimiterSchema, givenDialectSchema } from '../columns/given-dialect';
import { rejectionReasonSchema } from './rejection';

export const uploadStateSchema = z.enum(['receiving', 'stored', 'needs-columns', 'reading', 'read', 'rejected']);
export type UploadState = z.infer<typeof uploadStateSchema>;

const filenameSchema = z.string().min(1).max(255);
const sha256Schema = z.string().regex(/^[0-9a-f]{64}$/, 'Expected 64 hexadecimal digits.');

export const uploadSchema = z.strictObject({
  id: z.string(), study: z.string(), grid: z.string(), filename: z.string(), bytes: z.number().int(), sha256: z.string().nullable(),
  state: uploadStateSchema, partSize: z.number().int().nullable(),
  parts: z.array(z.strictObject({ number: z.number().int(), etag: z.string(), bytes: z.number().int() })).meta({ description: 'Parts stored so far.' }),
  rowsRead: z.number().int().nullable(), reasons: z.array(rejectionReasonSchema),
  fingerprint: z.string().nullable().meta({ description: 'SHA-256 of the first and the last megabyte, where it was stated at the start.' }),
  createdBy: z.string().meta({ description: 'E-mail address of who sends or sent it.' }), createdAt: timestampSchema,
  lastActivityAt: timestampSchema.meta({ description: 'When addresses for parts were last asked for.' }),
});
export type Upload = z.infer<typeof uploadSchema>;

export const startUploadSchema = z.strictObject({
  filename: filenameSchema, bytes: z.number().int().min(0).max(50e9), sha256: sha256Schema.optional(),
  fingerprint: sha256Schema.optional().meta({ description: 'SHA-256 of the first and the last megabyte together, by which the same file is known again.' }),
  replaces: z.string().nullable().optional().meta({
    description: 'The open upload of the grid that this one takes the place of, null for none: refused where it is another by now. Absent, whatever is open gives way.',
  }),
});
export type StartUploadInput = z.infer<typeof startUploadSchema>;
const startedUploadSchema = z.strictObject({ upload: z.string(), partSize: z.number().int(), createdAt: timestampSchema });

export const signPartsSchema = z.strictObject({ numbers: z.array(z.number().int().min(1).max(1000)).min(1).max(100) });
export type SignPartsInput = z.infer<typeof signPartsSchema>;
const signedPartsSchema = z.strictObject({
  parts: z.array(z.strictObject({ number: z.number().int(), url: z.string(), expiresAt: timestampSchema })),
});
export const completeUploadSchema = z.strictObject({
  parts: z.array(z.strictObject({ number: z.number().int(), etag: z.string() })).min(1).max(1000),
  sha256: sha256Schema.optional().meta({ description: 'Of the whole file; a file that is stored with another is rejected when it is read.' }),
});
export type CompleteUploadInput = z.infer<typeof completeUploadSchema>;

const previewQuerySchema = z.strictObject({
  delimiter: z.union([delimiterSchema, z.literal('auto')]).optional(),
  header: z.enum(['yes', 'no', 'auto']).optional(),
  decimal: z.union([decimalMarkSchema, z.literal('auto')]).optional(),
}).meta({ description: 'Text tables only: shows the table read so, before it is kept with the columns. `auto`, or absent beside another, is found out from the file; with none of them the table is read as the columns of the case say.' });
export type PreviewQuery = z.infer<typeof previewQuerySchema>;

export const previewSchema = z.strictObject({
  format: z.string(), dialect: z.string().meta({ description: 'What was recognised, in words.' }),
  table: z.strictObject({
    delimiter: delimiterSchema, hasHeader: z.boolean(),
    headerLine: z.int().min(1).nullable().meta({ description: 'The line that names the columns, null where none does.' }),
    decimalMark: decimalMarkSchema.nullable().meta({ description: 'Null where the first rows hold none.' }),
    given: givenDialectSchema.meta({ description: 'What of this was said; the rest was found out.' }),
  }).nullable().meta({ description: 'How a text table is written; null for other formats.' }),
  header: z.array(z.string()), firstRows: z.array(z.array(z.string())),
  mapping: columnMappingSchema.nullable().meta({ description: 'The mapping in force for the case, if any.' }),
  proposal: columnMappingSchema.partial().meta({ description: 'What matching names propose.' }),
  missing: z.array(z.string()).meta({ description: 'Coordinates, weight, fields and gradients that no column answers to.' }),
});
export type UploadPreview = z.infer<typeof previewSchema>;

const putDataQuerySchema = z.strictObject({ filename: filenameSchema.optional() });

export const putDataContract = contract({
  method: 'PUT', path: '/studies/{id}/grids/{label}/data', summary: 'Upload one file in one call', access: 'organisation', status: 202,
  query: putDataQuerySchema, response: uploadSchema, rawBody: true,
});
export const startUploadContract = contract({
  method: 'POST', path: '/studies/{id}/grids/{label}/upload', summary: 'Start an upload in parts', access: 'organisation', inSteps: true, status: 201,
  body: startUploadSchema, response: startedUploadSchema,
});
export const getUploadContract = contract({
  method: 'GET', path: '/uploads/{id}', summary: 'State of an upload', access: 'organisation', status: 200, response: uploadSchema,
});
export const deleteUploadContract = contract({
  method: 'DELETE', path: '/uploads/{id}', summary: 'Give up an upload that is not complete', access: 'organisation', status: 204,
});
export const signPartsContract = contract({
  method: 'POST', path: '/uploads/{id}/parts', summary: 'Addresses for parts', access: 'organisation', status: 200,
  body: signPartsSchema, response: signedPartsSchema, secret: true,
});
export const completeUploadContract = contract({
  method: 'POST', path: '/uploads/{id}/complete', summary: 'Close an upload', access: 'organisation', inSteps: true, status: 200,
  body: completeUploadSchema, response: uploadSchema,
});
export const previewContract = contract({
  method: 'GET', path: '/uploads/{id}/preview', summary: 'Header and first rows', access: 'organisation', status: 200, query: previewQuerySchema, response: previewSchema,
});
