import type { Pattern, SeriesNorm } from '../assessment';
import type { BoundaryEvidence } from './boundary-evidence';
import type { FieldOrders } from './field-orders';

/** How near an order must lie to the one a pattern predicts. */
const close = 0.15;
/** Orders this far apart are two orders. */
const clearly = 0.25;

/** What is known of the boundary: how many spacings the largest error lies from it, and how errors fall along it and inside; null where unknown. */
export interface NearBoundary { spacings: number | null; parts: BoundaryEvidence | null }

type Wanted = Partial<Record<SeriesNorm, number>>;

function evidenceOf({ last }: FieldOrders, wanted: Wanted): Record<string, number> | null {
  const norms = Object.entries(wanted) as [SeriesNorm, number][];
  const seen = norms.map(([norm, order]) => ({ norm, order: last[norm], wanted: order }));
  const isSeen = seen.every(({ order, wanted: at }) => order !== undefined && Math.abs(order - at) <= close);
  return isSeen ? Object.fromEntries(seen.map(({ norm, order = 0 }) => [norm, order])) : null;
}

/**
 * What the orders of one field in L1, L2 and L∞ look like beside each other: a shock (1, ½, 0), a contact under a scheme of
 * order m (m/(m+1), half that, 0), a limiter at smooth extrema (L2 about 5/3, L∞ about 4/3), a boundary closure
 * (an order clearly lower along the boundary than inside; where only the whole is known p, p − ½, p − 1 with the largest error near the boundary), a corner (L2 twice H1), first order everywhere, or 2 where 3
 * or more is claimed.
 */
export function normPatterns(field: FieldOrders, near: NearBoundary): Pattern[] {
  const { last, formalOrder } = field;
  if (formalOrder === null || !field.isOff) return [];
  const found = (code: Pattern['code'], evidence: Record<string, number> | null): Pattern[] => (evidence === null ? [] : [{ code, field: field.field, evidence }]);
  const closure = closureEvidence(field, formalOrder, near);
  if (closure) return found('boundary-closure', closure);
  const orders = Object.values(last);
  const allAt = (order: number) => orders.length > 0 && orders.every((each) => Math.abs(each - order) <= close);
  if (formalOrder >= 3 && allAt(2)) return found('stuck-at-two', { ...last });
  if (formalOrder >= 2 && allAt(1)) return found('first-order', { ...last });
  const shock = evidenceOf(field, { L1: 1, L2: 0.5, Linf: 0 });
  if (shock) return found('shock', shock);
  const m = formalOrder;
  const contact = evidenceOf(field, { L1: m / (m + 1), L2: m / (m + 1) / 2, Linf: 0 });
  if (contact) return found('contact', contact);
  const limiter = formalOrder === 2 ? evidenceOf(field, { L2: 5 / 3, Linf: 4 / 3 }) : null;
  if (limiter) return found('limiter', limiter);
  return found('corner', cornerEvidence(field, formalOrder));
}

function cornerEvidence({ last: { L2, H1 } }: FieldOrders, formalOrder: number): Record<string, number> | null {
  const isCorner = L2 !== undefined && H1 !== undefined && H1 > close && Math.abs(L2 - 2 * H1) <= close && L2 < formalOrder - close;
  return isCorner ? { L2, H1, regularity: H1 } : null;
}

/** Orders of the norms alone, where nothing tells the boundary from the inside; else a lower order along it than inside. */
function closureEvidence(field: FieldOrders, formalOrder: number, { spacings, parts }: NearBoundary): Record<string, number> | null {
  const { last } = field;
  if (parts) {
    const isLower = parts.boundaryOrder <= parts.interiorOrder - clearly && parts.boundaryOrder < formalOrder - close;
    if (!isLower || !parts.isLargerAtBoundary || cornerEvidence(field, formalOrder)) return null;
    return { ...last, boundaryOrder: parts.boundaryOrder, interiorOrder: parts.interiorOrder, ...(spacings !== null && { spacingsFromBoundary: spacings }) };
  }
  const seen = last.L1 === undefined ? null : evidenceOf(field, { L1: last.L1, L2: last.L1 - 0.5, Linf: last.L1 - 1 });
  const isInBand = spacings !== null && spacings <= 2;
  return seen && isInBand && Math.abs((last.L1 ?? 0) - formalOrder) <= clearly ? { ...seen, spacingsFromBoundary: spacings } : null;
}
