import { z } from 'zod';
import { procedures } from '@/lib/numerics/assessment';
import { contract } from '../api/contract';
import { labelSchema } from '../api/names';
import { cellsPerDirectionSchema, normNameSchema, spacingSchema } from '../cases/definition';
import { dimensionSchema } from '../problems/schema';
import { measuredSchema } from '../studies/input';
import { assessmentSchema } from './schema';

const positive = z.number().positive();
const perNorm = z.partialRecord(normNameSchema, z.number().nonnegative());
const orders = positive.max(20);
const tolerances = positive.max(5);

export const quickCheckSchema = z.strictObject({
  dimension: dimensionSchema.default(1),
  grids: z.array(z.strictObject({
    label: labelSchema.optional(), h: spacingSchema.optional(), cells: spacingSchema.optional(), cellsPerDirection: cellsPerDirectionSchema.optional(),
    value: measuredSchema.optional(), resolution: positive.optional(), errors: perNorm.optional(), iterativeError: perNorm.optional(),
  })).min(2).max(50),
  formalOrder: z.union([orders, z.partialRecord(normNameSchema, orders)]).optional(),
  tolerance: z.union([tolerances, z.partialRecord(normNameSchema, tolerances)]).optional(),
  minimumGrids: z.number().int().min(3).max(20).optional(),
  procedure: z.enum(procedures).optional(), uNumFactor: positive.max(10).optional(),
  expectExact: z.boolean().optional(), exactLimit: positive.optional(), reference: positive.optional(), derivedOrder: orders.optional(),
  knownValue: measuredSchema.optional(), target: positive.optional(),
}).meta({ description: 'One quantity (every grid has a value) or one field (every grid has errors).' });
export type QuickCheckInput = z.infer<typeof quickCheckSchema>;

export const assessContract = contract({
  method: 'POST', path: '/assess', summary: 'Assess a small table; nothing is kept', access: 'public', status: 200,
  body: quickCheckSchema, response: assessmentSchema,
});
