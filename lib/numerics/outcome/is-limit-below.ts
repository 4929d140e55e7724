import { aitkenLimit } from './aitken-limit';

interface Limits { formalOrder: number; tolerance: number }

/**
 * Whether orders that climb by shrinking steps are heading for a limit below the band: the last three steps up shrink,
 * and the last two Aitken limits z − (z−y)²/(z−2y+x) both lie below pf − tol and within tol of each other.
 *
 * `orders`: coarse to fine. False with fewer than four, and where a step goes down: that is no climb.
 */
export function isLimitBelow(orders: readonly number[], { formalOrder, tolerance }: Limits): boolean {
  const [w, x, y, z] = orders.slice(-4);
  if (w === undefined || x === undefined || y === undefined || z === undefined) return false;
  const steps = [x - w, y - x, z - y] as const;
  if (!(steps[0] > steps[1] && steps[1] > steps[2] && steps[2] > 0)) return false;
  const before = aitkenLimit(w, x, y);
  const last = aitkenLimit(x, y, z);
  const lowest = formalOrder - tolerance;
  if (before === null || last === null) return false;
  return before < lowest && last < lowest && Math.abs(last - before) <= tolerance;
}
