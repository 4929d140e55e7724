import { z } from 'zod';
import { labelSchema } from '../api/names';
import { cellsPerDirectionSchema, normNameSchema, spacingSchema } from '../cases/definition';
import { dimensionSchema } from '../problems/schema';

const positive = z.number().positive();
/** No quantity is larger; differences and fractions of such values stay within a double. */
export const measuredSchema = z.number().min(-1e100).max(1e100);
const measuredWithErrorsSchema = z.strictObject({
  value: measuredSchema, resolution: positive.optional(),
  iterativeError: z.number().nonnegative().max(1e100).optional(), timeError: z.number().nonnegative().max(1e100).optional(),
}).meta({ description: 'A value with one unit of its last digit, and what iteration and time step may have added, in its unit.' });
const perNorm = z.partialRecord(normNameSchema, z.number().nonnegative());

/** How a run was made: what an auditor needs to make it again. */
export const runRecordSchema = z.strictObject({
  compiler: z.string().max(300).optional(), flags: z.string().max(1000).optional(), precision: z.enum(['double', 'single']).optional(),
  platform: z.string().max(300).optional(), ranks: z.number().int().positive().optional(), meshTool: z.string().max(300).optional(),
  inputDeckSha256: z.string().regex(/^[0-9a-f]{64}$/).optional(), command: z.string().max(2000).optional(),
  iterativeTolerance: positive.optional(), wallTime: positive.optional().meta({ description: 'Seconds.' }),
});

export const gridInputSchema = z.strictObject({
  label: labelSchema,
  cells: z.number().int().positive().max(1e15).optional(), cellsPerDirection: cellsPerDirectionSchema.optional(),
  h: spacingSchema.optional(), dt: spacingSchema.optional(), t: z.number().optional(),
  values: z.record(z.string().min(1), z.union([measuredSchema, measuredWithErrorsSchema])).optional(),
  errors: z.record(z.string().min(1), perNorm).optional(),
  iterativeError: z.record(z.string().min(1), perNorm).optional(),
  run: runRecordSchema.optional(),
});
export type GridInput = z.infer<typeof gridInputSchema>;

export const refinementSchema = z.enum(['space', 'time', 'space-time']);
export type Refinement = z.infer<typeof refinementSchema>;

export const createStudySchema = z.strictObject({
  case: z.string().min(1), release: z.string().min(1).meta({ description: 'Version or id of a release of the case’s code.' }),
  refinement: refinementSchema.default('space'), dimension: dimensionSchema.optional(),
  grids: z.array(gridInputSchema).min(1).max(50),
});
export type CreateStudyInput = z.infer<typeof createStudySchema>;

export const updateGridSchema = gridInputSchema.omit({ label: true }).extend({
  exclude: z.string().trim().min(1).max(500).nullable().optional()
    .meta({ description: 'Reason for leaving the grid out, printed; null takes it back in.' }),
}).meta({ description: 'Members given replace those of the grid.' });
export type UpdateGridInput = z.infer<typeof updateGridSchema>;
