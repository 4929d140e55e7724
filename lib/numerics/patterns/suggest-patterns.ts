import type { FieldAssessment, Pattern, Position } from '../assessment';
import { pairwiseOrder } from '../order/pairwise-order';
import { boundaryEvidence } from './boundary-evidence';
import { fieldOrders, type FieldOrders } from './field-orders';
import { normPatterns } from './norm-patterns';
import { trendPatterns } from './trend-patterns';

/** What is known beside the norms. */
export interface Surroundings {
  /** Signed weighted mean of the error of a field, by grid. */
  means?: readonly { field: string; label: string; mean: number }[];
  /** The box of the problem, an interval for each coordinate. */
  box?: Partial<Record<keyof Position, readonly [number, number]>> | null;
}

/** Orders under this are those of an error that as good as stands still. */
const flat = 0.25;

/**
 * What the pattern of orders suggests, with its evidence: a hint, never an outcome. Only of fields that were judged and
 * did not pass. `fields` as assessed, finest grid first.
 */
export function suggestPatterns(fields: readonly FieldAssessment[], around: Surroundings = {}): Pattern[] {
  const all = fieldOrders(fields);
  return [...flatPatterns(all, around), ...all.flatMap((field) => (isFlat(field) ? [] : [...normPatterns(field, { spacings: spacingsFromBoundary(field, around), parts: boundaryEvidence(field.field, fields) }), ...trendPatterns(field)]))];
}

function mainOrder({ last }: FieldOrders): number | null {
  return last.L2 ?? last.L1 ?? last.Linf ?? null;
}

function isFlat(field: FieldOrders): boolean {
  const order = mainOrder(field);
  const { formalOrder, isOff, last } = field;
  return isOff && order !== null && formalOrder !== null && formalOrder >= 1 && Object.values(last).every((each) => Math.abs(each) < flat);
}

/** Fields whose error stands still: a datum where removing the mean brings the order back, else one equation, or all. */
function flatPatterns(all: readonly FieldOrders[], { means = [] }: Surroundings): Pattern[] {
  const still = all.filter(isFlat);
  const datum = still.flatMap((field) => datumPattern(field, means));
  const rest = still.filter(({ field }) => !datum.some((pattern) => pattern.field === field));
  if (rest.length > 0 && rest.length === all.length) return [...datum, { code: 'all-flat', evidence: { fields: rest.length, highestOrder: Math.max(...rest.map((field) => mainOrder(field) ?? 0)) } }];
  const fine = all.filter((field) => !still.includes(field)).flatMap((field) => mainOrder(field) ?? []);
  return [...datum, ...rest.map((field): Pattern => ({ code: 'one-field-flat', field: field.field, evidence: { order: mainOrder(field) ?? 0, lowestOther: Math.min(...fine) } }))];
}

/** The L2 error without its mean is √(L2² − mean²): where that falls, only a constant was wrong. */
function datumPattern({ field, parts, formalOrder }: FieldOrders, means: NonNullable<Surroundings['means']>): Pattern[] {
  const grids = parts.find(({ norm }) => norm === 'L2')?.grids ?? [];
  const [fine, coarse] = grids.flatMap((grid) => {
    const mean = means.find((each) => each.field === field && each.label === grid.label)?.mean;
    return mean === undefined ? [] : [{ h: grid.h, error: Math.sqrt(Math.max(0, grid.error ** 2 - mean ** 2)), knownError: 0 }];
  });
  if (!fine || !coarse || formalOrder === null || fine.error === 0 || coarse.error === 0) return [];
  const { order } = pairwiseOrder(coarse, fine);
  return order !== null && order > formalOrder / 2 ? [{ code: 'datum', field, norm: 'L2', evidence: { orderWithoutMean: order } }] : [];
}

/** How many spacings the largest error of the finest grid lies from the boundary of the box; null where unknown. */
function spacingsFromBoundary({ parts }: FieldOrders, { box }: Surroundings): number | null {
  const grid = parts.find(({ norm }) => norm === 'Linf')?.grids[0];
  if (!grid?.at || !box) return null;
  const distances = (['x', 'y', 'z'] as const).flatMap((axis) => {
    const [at, side] = [grid.at?.[axis], box[axis]];
    return at === undefined || side === undefined ? [] : [at - side[0], side[1] - at];
  });
  return distances.length === 0 ? null : Math.max(0, Math.min(...distances)) / grid.h;
}
