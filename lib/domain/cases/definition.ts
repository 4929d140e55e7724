import { z } from 'zod';
import { norms, procedures } from '@/lib/numerics/assessment';
import { labelSchema } from '../api/names';

const positive = z.number().positive();
/** A spacing, a time step, or what makes one: ratios of such stay within a double. */
export const spacingSchema = z.number().min(1e-100).max(1e100);
const count = z.number().int().positive().max(1e15);
export const cellsPerDirectionSchema = z.union([count, z.array(count).min(1).max(3)])
  .meta({ description: 'Cells along each direction: one number for all, or one for each.' });

export const normNameSchema = z.enum(norms);
export const caseKindSchema = z.enum(['order', 'exactness', 'benchmark', 'solution']);
export type CaseKind = z.infer<typeof caseKindSchema>;

const backingSchema = z.union([z.strictObject({ scheme: z.string().min(1) }), z.strictObject({ citation: z.string().trim().min(1).max(1000) })]);

const declaredNormSchema = z.strictObject({
  norm: normNameSchema,
  formalOrder: positive.max(20).optional(),
  tolerance: positive.max(5).optional(),
  counts: z.boolean().default(true),
  expectExact: z.boolean().default(false),
  exactLimit: positive.optional(),
  reference: positive.optional(),
  derivedOrder: positive.max(20).optional(),
  logFactor: z.number().min(-10).max(10).optional().meta({ description: 'k of an error C·h^p·|ln(h/L)|^k.' }),
  regularity: positive.max(20).optional().meta({ description: 'λ of a solution u ~ r^λ, which may limit the formal order.' }),
  backing: backingSchema.optional(),
});
export type DeclaredNorm = z.infer<typeof declaredNormSchema>;

const declaredFieldSchema = z.strictObject({
  field: z.string().regex(/^[A-Za-z][A-Za-z0-9_]{0,39}$/, 'Expected a name such as u or T.'),
  compare: z.string().trim().min(1).max(4000).optional(),
  datum: z.enum(['none', 'mean', 'scale', 'rigid']).default('none'),
  norms: z.array(declaredNormSchema).min(1),
});
export type DeclaredField = z.infer<typeof declaredFieldSchema>;

const declaredQuantitySchema = z.strictObject({
  name: z.string().trim().min(1).max(80),
  unit: z.string().trim().max(40).optional(),
  formalOrder: positive.max(20).optional(),
  knownValue: z.number().optional(),
  target: positive.optional().meta({ description: 'Largest acceptable GCI, as a fraction.' }),
  procedure: z.enum(procedures).default('three-grid'),
  energyLike: z.boolean().optional().meta({ description: 'An energy or eigenvalue: where elements of degree k are stated and no formal order, it is 2k.' }),
  uNumFactor: positive.max(10).optional().meta({ description: 'k: what the band of about 95 % is divided by to give u_num.' }),
});
export type DeclaredQuantity = z.infer<typeof declaredQuantitySchema>;

const plannedGridSchema = z.strictObject({
  label: labelSchema, cells: count.optional(), cellsPerDirection: cellsPerDirectionSchema.optional(), h: spacingSchema.optional(), dt: spacingSchema.optional(),
});

/** What of a case is kept in revisions and frozen when the first data of a study arrives. */
export const caseDefinitionSchema = z.strictObject({
  options: z.record(z.string().min(1).max(80), z.string().max(200)).default({}),
  fields: z.array(declaredFieldSchema).max(50).default([]),
  quantities: z.array(declaredQuantitySchema).max(50).default([]),
  sampling: z.enum(['point', 'average', 'quadrature']).optional(),
  sourceSampling: z.enum(['point', 'average', 'quadrature']).optional(),
  elements: z.strictObject({ degree: z.number().int().min(1).max(12) }).optional()
    .meta({ description: 'Finite elements of this degree k: formal orders that are not stated are then k + 1 in L1, L2 and L∞, and k in H1, the energy norm and for derivatives.' }),
  minimumGrids: z.number().int().min(3).max(20).optional(),
  boundaryBand: z.strictObject({ thickness: positive }).optional(),
  gridPlan: z.array(plannedGridSchema).max(30).default([]),
  requirements: z.array(z.string().trim().min(1).max(80)).max(50).default([]),
});
export type CaseDefinition = z.infer<typeof caseDefinitionSchema>;
