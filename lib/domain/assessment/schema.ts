import { z } from 'zod';
import { norms, patternCodes, procedureBranches, procedures, reasonCodes, regions } from '@/lib/numerics/assessment';

const nullableNumber = z.number().nullable();
const pointSchema = z.strictObject({ x: z.number(), y: z.number().optional(), z: z.number().optional() });
export const outcomeSchema = z.enum(['pass', 'fail', 'inconclusive', 'meets-target', 'misses-target']);
export const reasonCodeSchema = z.enum(reasonCodes);
const convergenceSchema = z.enum(['monotone', 'oscillatory', 'divergent', 'oscillatory-divergent', 'unchanged']);

const similaritySchema = z.strictObject({
  coarse: z.string(), fine: z.string(), low: nullableNumber, median: nullableNumber, high: nullableNumber, directions: z.array(z.number()).optional(), isAlike: z.boolean(),
}).meta({ description: 'How cells shrink from one grid to the next: the median and the 5 and 95 % quantiles, by volume, of the local ratio of their sizes, null where weights are not volumes; the ratio along each direction where it is known.' });

const fieldGridSchema = z.strictObject({
  label: z.string(), h: z.number(), error: z.number(), relativeError: nullableNumber, knownError: z.number(), used: z.boolean(),
  unusedReason: z.enum(['round-off', 'known-error']).optional(), at: pointSchema.optional(), correctedError: z.number().optional(),
});
const fieldAssessmentSchema = z.strictObject({
  field: z.string(), norm: z.enum([...norms, 'value']), region: z.enum(regions),
  formalOrder: nullableNumber, statedOrder: z.number().optional(), regularity: z.number().optional(), logFactor: z.number().optional(),
  elements: z.strictObject({ degree: z.number(), order: z.number() }).optional(),
  derivedOrder: nullableNumber, tolerance: nullableNumber, counts: z.boolean(),
  comparedTo: z.strictObject({ label: z.string(), h: z.number() }).optional()
    .meta({ description: 'Without an exact solution: every error is the norm of the difference to the next coarser grid, the last one to this.' }),
  grids: z.array(fieldGridSchema),
  orders: z.array(z.strictObject({ coarse: z.string(), fine: z.string(), ratio: z.number(), order: nullableNumber, uncertainty: nullableNumber })),
  fit: z.strictObject({ order: z.number(), low: nullableNumber, high: nullableNumber }).nullable(),
  outcome: outcomeSchema.nullable(), reasons: z.array(reasonCodeSchema), dissimilar: z.array(similaritySchema).optional(),
});
const valueFitSchema = z.strictObject({
  kind: z.enum(['power', 'first-term', 'second-term', 'two-terms']), weighted: z.boolean(), value0: z.number(), alpha: z.array(z.number()),
  order: nullableNumber, sigma: z.number(), dataRange: z.number(), uncertainty: z.array(z.number()), atBound: z.enum(['lowest', 'highest']).nullable(),
});
const quantityAssessmentSchema = z.strictObject({
  name: z.string(), unit: z.string().nullable(), formalOrder: nullableNumber, target: nullableNumber,
  values: z.array(z.strictObject({ label: z.string(), h: z.number(), value: z.number() })),
  convergence: convergenceSchema.nullable(),
  orderObserved: nullableNumber, orderRange: z.tuple([z.number(), z.number()]).nullable(), formulaValue: nullableNumber, orderUsed: nullableNumber,
  extrapolated: nullableNumber, relativeChange: nullableNumber, extrapolatedError: nullableNumber,
  safetyFactor: nullableNumber, gci: nullableNumber, gciAbsolute: nullableNumber, gciCoarse: nullableNumber, asymptoticRatio: nullableNumber,
  halfRange: nullableNumber,
  procedure: z.enum(procedures), branch: z.enum(procedureBranches),
  constants: z.record(z.string(), z.number()).optional(), fit: valueFitSchema.nullable().optional(),
  uncertainty: nullableNumber.optional().meta({ description: 'U of the finest grid in the quantity’s unit, where the procedure gives one instead of a GCI.' }),
  uncertaintyFraction: nullableNumber.optional(), uNum: nullableNumber.optional().meta({ description: 'Standard uncertainty of the finest grid, in the unit; only where the factor is stated.' }),
  triples: z.array(z.strictObject({ grids: z.array(z.string()), order: nullableNumber, convergence: convergenceSchema })),
  outcome: outcomeSchema.nullable(), reasons: z.array(reasonCodeSchema), dissimilar: z.array(similaritySchema).optional(),
});

const spreadSchema = z.strictObject({ A: z.number(), p: z.number(), B: z.number(), q: z.number(), rho: nullableNumber });
const spaceTimeSchema = z.strictObject({
  field: z.string(), norm: z.enum([...norms, 'value']), formalOrder: nullableNumber,
  A: nullableNumber, p: nullableNumber, B: nullableNumber, q: nullableNumber, rho: nullableNumber, residual: nullableNumber, spread: spreadSchema.nullable(),
  points: z.array(z.strictObject({ label: z.string(), h: z.number(), dt: z.number(), error: z.number(), space: nullableNumber, time: nullableNumber })),
}).meta({ description: 'E² = A²h^2p + 2ρAB·h^pΔt^q + B²Δt^2q; E = Ah^p + BΔt^q where the error has a sign (ρ null). Null members: too few points for a fit.' });

export const meshSchema = z.strictObject({
  low: z.array(z.number()), high: z.array(z.number()),
  duplicates: z.strictObject({ rows: z.number(), oneIn: z.number().int() })
    .meta({ description: 'Rows with the coordinates of an earlier one; of more than 16 384 rows an estimate from one row in `oneIn`.' }),
}).meta({ description: 'Bounds of the coordinates along x, y, z, and rows that repeat them.' });

/** What was computed for one revision of a study; it never changes. */
export const assessmentSchema = z.strictObject({
  outcome: outcomeSchema.nullable(), reasons: z.array(reasonCodeSchema),
  fields: z.array(fieldAssessmentSchema), quantities: z.array(quantityAssessmentSchema),
  spaceTime: z.array(spaceTimeSchema).optional().meta({ description: 'Only of a study refined in space and time together, which has no outcome.' }),
  similarity: z.strictObject({ isSimilar: z.boolean(), pairs: z.array(similaritySchema) }).optional().meta({ description: 'Of the two finest pairs; absent where nothing is known of them.' }),
  patterns: z.array(z.strictObject({
    code: z.enum(patternCodes), field: z.string().optional(), norm: z.enum([...norms, 'value']).optional(), evidence: z.record(z.string(), z.number()),
  })).meta({ description: 'Hints with the figures that suggest them, never an outcome.' }),
  inputs: z.array(z.strictObject({
    label: z.string(), sha256: z.string(), bytes: z.number(), rows: z.number(),
    weightSum: nullableNumber.optional().meta({ description: 'Null where every row weighs the same; absent from assessments made before it was kept.' }),
    mesh: meshSchema.optional(),
  })),
  inputsSha256: z.string(), numericsVersion: z.string(),
});
export type Assessment = z.infer<typeof assessmentSchema>;
