import type { Pattern, SeriesNorm } from '../assessment';
import type { FieldOrders } from './field-orders';

interface Seen { code: 'falling-order' | 'alternating'; norm: SeriesNorm; size: number; evidence: Record<string, number> }

/** Smaller changes from pair to pair are noise. */
const step = 0.3;

/**
 * What the orders of a norm do from pair to pair, coarse to fine: fall under refinement by 0.3 or more over the last three
 * (a floor of iteration, storage or the other variable), or alternate by 0.3 or more (grids not similar). One hint a field,
 * from the norm that shows it most; only where the norm was judged and did not pass.
 */
export function trendPatterns({ field, parts }: FieldOrders): Pattern[] {
  const seen = parts.filter(({ outcome }) => outcome !== null && outcome !== 'pass').flatMap(({ norm, orders, formalOrder }): Seen[] => {
    const all = orders.flatMap(({ order }) => order ?? []).reverse();
    const [a, b, c] = all.slice(-3);
    if (a === undefined || b === undefined || c === undefined) return [];
    const [first, second] = [b - a, c - b];
    if (first < 0 && second < 0 && a - c >= step && formalOrder !== null && c < formalOrder) return [{ code: 'falling-order', norm, size: a - c, evidence: { first: a, last: c } }];
    if (first * second < 0 && Math.min(Math.abs(first), Math.abs(second)) >= step) {
      return [{ code: 'alternating', norm, size: Math.min(Math.abs(first), Math.abs(second)), evidence: { before: a, between: b, last: c } }];
    }
    return [];
  });
  const [most] = seen.sort((left, right) => right.size - left.size);
  return most ? [{ code: most.code, field, norm: most.norm, evidence: most.evidence }] : [];
}
