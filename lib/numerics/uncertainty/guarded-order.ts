/** W. L. Oberkampf and C. J. Roy, Verification and Validation in Scientific Computing (2010), 8.7, as remembered. */
export const guardedConstants = { agreement: 0.1, near: 1.25, off: 3, lowest: 0.5 } as const;
const roundingSlack = 1e-12;

interface GuardedOrder { order: number; safetyFactor: number; branch: 'near-formal' | 'off-formal' | 'order-undefined' }

/**
 * The order and safety factor of the guarded procedure: within 10 % of the formal order, that and 1.25; otherwise a
 * factor of 3 with the observed order kept between 0.5 and the formal one. An undefined or negative order reads as 0.5,
 * so that there is always a band. Throws for a formal order of 0 or less.
 */
export function guardedOrder(observed: number | null, formalOrder: number): GuardedOrder {
  if (!(formalOrder > 0)) throw new RangeError(`formalOrder must be above 0, got ${formalOrder}`);
  const { agreement, near, off, lowest } = guardedConstants;
  if (observed === null || observed < 0) return { order: lowest, safetyFactor: off, branch: 'order-undefined' };
  if (Math.abs(observed - formalOrder) / formalOrder <= agreement + roundingSlack) return { order: formalOrder, safetyFactor: near, branch: 'near-formal' };
  return { order: Math.min(Math.max(lowest, observed), formalOrder), safetyFactor: off, branch: 'off-formal' };
}
