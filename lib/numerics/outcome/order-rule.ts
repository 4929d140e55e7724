import type { Outcome, ReasonCode } from '../assessment';
import { isLimitBelow } from './is-limit-below';
import { isDeparting } from './is-departing';

interface Observed {
  /** Order and uncertainty of each pair, coarse to fine, two or more. */
  pairs: readonly { order: number; uncertainty: number }[];
  /** Errors of the grids used, coarse to fine. */
  errors: readonly number[];
}

/** The gap that is closing must have shrunk by this much. */
const closing = 1.25;

/**
 * Steps 4 to 8 of the outcome rule: what the observed orders of a series say about its formal order. The first match
 * wins; a, b are the orders of the last two pairs, u their uncertainties, the band is [pf − tol + u, pf + 2tol − u].
 * How often the rule errs is measured in the checks (operating characteristic). Throws with fewer than two pairs.
 */
export function orderRule({ pairs, errors }: Observed, formalOrder: number, tolerance: number): { outcome: Outcome; reason: ReasonCode } {
  const a = pairs.at(-2);
  const b = pairs.at(-1);
  if (!a || !b) throw new RangeError(`pairs must be two or more, got ${pairs.length}`);
  const [lowest, highest] = [formalOrder - tolerance, formalOrder + 2 * tolerance];
  const inBand = ({ order, uncertainty }: typeof a) => order >= lowest + uncertainty && order <= highest - uncertainty;
  const [gapA, gapB] = [formalOrder - a.order, formalOrder - b.order];

  if (b.order > highest + b.uncertainty) return inconclusive('above-formal');
  if (inBand(a) && inBand(b)) {
    if (!isFalling(errors.slice(-3))) return inconclusive('errors-rise');
    if (isDeparting(pairs.map((pair) => formalOrder - pair.order), b.uncertainty, tolerance)) return inconclusive('departing');
    return { outcome: 'pass', reason: 'in-band' };
  }
  if (inBand(b)) return inconclusive('one-pair-only');
  if (b.order + b.uncertainty < lowest) {
    if (gapA > 0 && gapB * closing <= gapA) {
      const limitBelow = isLimitBelow(pairs.map((pair) => pair.order), { formalOrder, tolerance });
      return limitBelow ? { outcome: 'fail', reason: 'limit-below-formal' } : inconclusive('climbing');
    }
    if (a.order + a.uncertainty < lowest) return { outcome: 'fail', reason: 'below-formal' };
    return inconclusive(inBand(a) ? 'left-band' : 'scatter');
  }
  return inconclusive('within-uncertainty');
}

function inconclusive(reason: ReasonCode): { outcome: Outcome; reason: ReasonCode } {
  return { outcome: 'inconclusive', reason };
}

function isFalling(errors: readonly number[]): boolean {
  return errors.every((error, index) => index === 0 || error < (errors[index - 1] ?? Infinity));
}
