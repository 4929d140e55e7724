import { z } from 'zod';

export const rejectionCodes = [
  'empty-file', 'unsupported-format', 'binary-content', 'damaged-gzip', 'damaged-file', 'expands-too-far', 'too-many-columns', 'too-much-computing', 'too-much-memory', 'malformed-json', 'malformed-vtk', 'mixed-rows', 'unsupported-cell', 'mixed-cells', 'line-too-long',
  'too-many-values', 'column-missing', 'column-type', 'duplicate-column', 'too-few-rows', 'short-row', 'long-row', 'column-length',
  'missing-value', 'not-a-number', 'not-finite', 'mixed-decimal', 'weight-not-positive', 'exact-not-finite', 'time-differs', 'points-differ', 'checksum-differs',
] as const;
export type RejectionCode = (typeof rejectionCodes)[number];

/** Why a file was rejected: how often, and where it first occurs (lines and columns from 1, null where there is no such place). */
export const rejectionReasonSchema = z.strictObject({
  code: z.enum(rejectionCodes),
  count: z.int().min(1),
  line: z.int().min(1).nullable(),
  column: z.int().min(1).nullable(),
  found: z.string().nullable(),
  expected: z.string().nullable(),
});

export type RejectionReason = z.infer<typeof rejectionReasonSchema>;
