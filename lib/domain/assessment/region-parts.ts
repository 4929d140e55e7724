import type { FieldAssessment } from '@/lib/numerics/assessment';

/** The two parts that the rows of a grid are told apart into, of one field and norm. */
export interface RegionPair { band: '2h' | 'fixed'; interior: FieldAssessment; boundary: FieldAssessment }
export interface RegionRow { whole: FieldAssessment; pairs: RegionPair[] }

/** Below the tolerance of a norm orders are judged alike; where none is stated a fifth of an order is. */
const usualTolerance = 0.2;

/** Fields and norms that have norms of their parts, in the order of the assessment. */
export function regionRows(fields: readonly FieldAssessment[]): RegionRow[] {
  return fields.filter(({ region }) => region === 'all').flatMap((whole) => {
    const part = (region: FieldAssessment['region']) => fields.find((each) => each.region === region && each.field === whole.field && each.norm === whole.norm);
    const pairs = (['2h', 'fixed'] as const).flatMap((band): RegionPair[] => {
      const [interior, boundary] = [part(`interior-${band}`), part(`boundary-${band}`)];
      return interior && boundary ? [{ band, interior, boundary }] : [];
    });
    return pairs.length > 0 ? [{ whole, pairs }] : [];
  });
}

/** The order of the last pair of grids, null where it has none. */
export const lastOrder = ({ orders }: FieldAssessment): number | null => orders[0]?.order ?? null;

/**
 * The orders inside and near the boundary, where the one near the boundary is lower by more than the tolerance, and lower
 * than declared where an order is; else null.
 */
export function lowerAtBoundary({ tolerance, formalOrder, derivedOrder }: FieldAssessment, { interior, boundary }: RegionPair): { interior: number; boundary: number } | null {
  const orders = { interior: lastOrder(interior), boundary: lastOrder(boundary) };
  const most = Math.min(orders.interior ?? -Infinity, derivedOrder ?? formalOrder ?? Infinity) - (tolerance ?? usualTolerance);
  if (orders.interior === null || orders.boundary === null || orders.boundary >= most) return null;
  return { interior: orders.interior, boundary: orders.boundary };
}
