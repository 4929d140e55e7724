import type { Pattern, SeriesNorm } from '../assessment';
import type { FieldOrders } from './field-orders';

/** How near an order must lie to the one a pattern predicts. */
const near = 0.15;

type Wanted = Partial<Record<SeriesNorm, number>>;

function evidenceOf({ last }: FieldOrders, wanted: Wanted): Record<string, number> | null {
  const norms = Object.entries(wanted) as [SeriesNorm, number][];
  const seen = norms.map(([norm, order]) => ({ norm, order: last[norm], wanted: order }));
  const isSeen = seen.every(({ order, wanted: at }) => order !== undefined && Math.abs(order - at) <= near);
  return isSeen ? Object.fromEntries(seen.map(({ norm, order = 0 }) => [norm, order])) : null;
}

/**
 * What the orders of one field in L1, L2 and L∞ look like beside each other: a shock (1, ½, 0), a contact under a scheme of
 * order m (m/(m+1), half that, 0), a limiter at smooth extrema (L2 about 5/3, L∞ about 4/3), a boundary closure
 * (p, p − ½, p − 1 with the largest error near the boundary), a corner (L2 twice H1), first order everywhere, or 2 where 3
 * or more is claimed. `atBoundary` tells how many spacings the largest error lies from the boundary, null where unknown.
 */
export function normPatterns(field: FieldOrders, atBoundary: number | null): Pattern[] {
  const { last, formalOrder } = field;
  if (formalOrder === null || !field.isOff) return [];
  const found = (code: Pattern['code'], evidence: Record<string, number> | null): Pattern[] => (evidence === null ? [] : [{ code, field: field.field, evidence }]);
  const closure = last.L1 === undefined ? null : evidenceOf(field, { L1: last.L1, L2: last.L1 - 0.5, Linf: last.L1 - 1 });
  const isInBand = atBoundary !== null && atBoundary <= 2;
  if (closure && isInBand && Math.abs((last.L1 ?? 0) - formalOrder) <= 0.25) return found('boundary-closure', { ...closure, spacingsFromBoundary: atBoundary });
  const orders = Object.values(last);
  const allAt = (order: number) => orders.length > 0 && orders.every((each) => Math.abs(each - order) <= near);
  if (formalOrder >= 3 && allAt(2)) return found('stuck-at-two', { ...last });
  if (formalOrder >= 2 && allAt(1)) return found('first-order', { ...last });
  const shock = evidenceOf(field, { L1: 1, L2: 0.5, Linf: 0 });
  if (shock) return found('shock', shock);
  const m = formalOrder;
  const contact = evidenceOf(field, { L1: m / (m + 1), L2: m / (m + 1) / 2, Linf: 0 });
  if (contact) return found('contact', contact);
  const limiter = formalOrder === 2 ? evidenceOf(field, { L2: 5 / 3, Linf: 4 / 3 }) : null;
  if (limiter) return found('limiter', limiter);
  const { L2, H1 } = last;
  const isCorner = L2 !== undefined && H1 !== undefined && H1 > near && Math.abs(L2 - 2 * H1) <= near && L2 < formalOrder - near;
  return isCorner ? found('corner', { L2, H1, regularity: H1 }) : [];
}
