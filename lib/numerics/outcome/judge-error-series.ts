import type { ErrorSeries, FieldAssessment, FieldGrid, Outcome, PairOrder, ReasonCode } from '../assessment';
import { leastSquaresOrder } from '../order/least-squares-order';
import { spansRatio } from '../spacing/spans-ratio';
import { defaultTolerance } from './default-tolerance';
import { dropFloor } from './drop-floor';
import { orderRule } from './order-rule';
import { pairOrders } from './pair-orders';
import { roundOff } from './round-off';

/** From this order on it matters whether values are points or averages: the two differ by h². */
const samplingMatters = 3;

interface Verdict { outcome: Outcome | null; reason: ReasonCode }

/**
 * Judges one field and norm by its errors over grids, the finest first: exactness, the floor, too few grids, then the
 * observed orders against the formal one (orderRule). A declared derived order replaces the formal one in every step.
 *
 * The outcome is null with `no-target` where there is no formal order to judge by. Orders of grids left out are not
 * given; an order is null where an error is 0. Throws where spacings do not rise or an error is negative or not finite.
 */
export function judgeErrorSeries(series: ErrorSeries): FieldAssessment {
  checkSeries(series);
  const judgedBy = series.derivedOrder ?? series.formalOrder;
  const tolerance = series.tolerance ?? (judgedBy === null ? null : defaultTolerance(series.norm, judgedBy));
  const grids = dropFloor(series);
  const used = grids.filter((grid) => grid.used);
  const orders = pairOrders(used);
  const { outcome, reason } = judgeExactness(series, judgedBy) ?? judgeOrders(series, { used, orders, judgedBy, tolerance });
  return {
    field: series.field, norm: series.norm, region: 'all', formalOrder: series.formalOrder, derivedOrder: series.derivedOrder,
    tolerance, counts: series.counts, grids, orders, fit: leastSquaresOrder(used), outcome, reasons: [reason],
  };
}

function judgeExactness(series: ErrorSeries, judgedBy: number | null): Verdict | null {
  if (series.grids.length === 0) return null;
  const limit = series.exactLimit ?? roundOff(series);
  const exact = series.grids.every((grid) => grid.error <= limit);
  if (series.expectExact) return exact ? { outcome: 'pass', reason: 'exact' } : { outcome: 'fail', reason: 'not-exact' };
  return exact && judgedBy !== null ? { outcome: 'inconclusive', reason: 'exact-not-declared' } : null;
}

interface Orders { used: FieldGrid[]; orders: PairOrder[]; judgedBy: number | null; tolerance: number | null }

function judgeOrders(series: ErrorSeries, { used, orders, judgedBy, tolerance }: Orders): Verdict {
  if (judgedBy === null || tolerance === null) return { outcome: null, reason: 'no-target' };
  if (!series.samplingStated && judgedBy >= samplingMatters) return { outcome: 'inconclusive', reason: 'sampling-not-stated' };
  const enough = used.length >= series.minimumGrids && spansRatio(used.map((grid) => grid.h)) && orders.length >= 2;
  if (!enough) return { outcome: 'inconclusive', reason: 'too-few-grids' };
  const errors = used.map((grid) => grid.error).reverse();
  const pairs = orders.flatMap(({ order, uncertainty }) => (order === null || uncertainty === null ? [] : { order, uncertainty })).reverse();
  if (errors.includes(0)) return { outcome: 'inconclusive', reason: 'scatter' };
  return orderRule({ pairs, errors }, judgedBy, tolerance);
}

function checkSeries({ field, norm, grids }: ErrorSeries): void {
  grids.forEach(({ label, h, error, knownError }, index) => {
    const where = `of ${field} (${norm}) on grid ${label}`;
    if (!(h > (grids[index - 1]?.h ?? 0) && Number.isFinite(h))) throw new RangeError(`h ${where} must exceed that of the finer grid, got ${h}`);
    if (!(error >= 0 && Number.isFinite(error))) throw new RangeError(`error ${where} must be 0 or above, got ${error}`);
    if (!(knownError >= 0 && Number.isFinite(knownError))) throw new RangeError(`knownError ${where} must be 0 or above, got ${knownError}`);
  });
}
