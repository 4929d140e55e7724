import type { ErrorSeries, FieldAssessment, FieldGrid, Outcome, PairOrder, ReasonCode } from '../assessment';
import { leastSquaresOrder } from '../order/least-squares-order';
import { spansRatio } from '../spacing/spans-ratio';
import { defaultTolerance } from './default-tolerance';
import { dropFloor } from './drop-floor';
import { logPart } from './log-corrected';
import { orderRule } from './order-rule';
import { pairOrders } from './pair-orders';
import { regularOrder } from './regular-order';
import { roundOff } from './round-off';

/** From this order on it matters whether values are points or averages: the two differ by h². */
const samplingMatters = 3;

interface Verdict { outcome: Outcome | null; reason: ReasonCode }

/**
 * Judges one field and norm by its errors over grids, the finest first: exactness, the floor, too few grids, then the
 * observed orders against the formal one (orderRule), of the errors without their logarithm where they have one. A declared
 * derived order replaces the formal one in every step; the regularity may lower it. A pass on grids that are not refined
 * alike is inconclusive.
 *
 * Norms of differences of consecutive solutions (`comparedTo`) are judged as errors are; their orders take three grids each.
 *
 * The outcome is null with `no-target` where there is no formal order to judge by. Orders of grids left out are not
 * given; an order is null where an error is 0. Throws where spacings do not rise or an error is negative or not finite.
 */
export function judgeErrorSeries(series: ErrorSeries): FieldAssessment {
  checkSeries(series);
  const { formalOrder, limited } = limitOrder(series);
  const judgedBy = series.derivedOrder ?? formalOrder;
  const tolerance = series.tolerance ?? (judgedBy === null ? null : defaultTolerance(series.norm, judgedBy));
  const grids = dropFloor(series).map((grid) => withoutLogarithm(grid, series.logFactor));
  const used = grids.filter((grid) => grid.used).map(asJudged);
  const orders = pairOrders(used, series.comparedTo);
  const { outcome, reason } = judgeExactness(series, judgedBy) ?? onSimilarGrids(series, judgeOrders(series, { used, orders, judgedBy, tolerance }));
  return {
    field: series.field, norm: series.norm, region: series.region ?? 'all', formalOrder, ...limited,
    ...(series.elements && { elements: { degree: series.elements.degree, order: series.elements.order } }),
    ...(series.logFactor && { logFactor: series.logFactor.power }), derivedOrder: series.derivedOrder, tolerance, counts: series.counts, grids, orders, fit: leastSquaresOrder(used), ...(series.comparedTo && { comparedTo: series.comparedTo, fit: null }), ...(isPart(series) ? { outcome: null, reasons: [] } : { outcome, reasons: [reason], ...(reason === 'not-similar' && { dissimilar: [...(series.dissimilar ?? [])] }) }),
  };
}

/** Norms of a part of the domain are shown and not judged. */
function isPart({ region = 'all' }: ErrorSeries): boolean {
  return region !== 'all';
}

function limitOrder({ norm, formalOrder, regularity = null }: ErrorSeries): { formalOrder: number | null; limited: { statedOrder?: number; regularity?: number } } {
  if (formalOrder === null || regularity === null) return { formalOrder, limited: {} };
  const left = regularOrder(norm, formalOrder, regularity);
  return { formalOrder: left, limited: left < formalOrder ? { statedOrder: formalOrder, regularity } : {} };
}

function withoutLogarithm(grid: FieldGrid, logFactor: ErrorSeries['logFactor']): FieldGrid {
  return logFactor ? { ...grid, correctedError: grid.error / logPart(grid.h, logFactor) } : grid;
}

/** The grid with the error that its order is read from, and its known error in proportion. */
function asJudged(grid: FieldGrid): FieldGrid {
  const { correctedError, error, knownError } = grid;
  return correctedError === undefined || error === 0 ? grid : { ...grid, error: correctedError, knownError: knownError * (correctedError / error) };
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
  if (series.elements?.atQuadrature === false || (!series.samplingStated && judgedBy >= samplingMatters)) return { outcome: 'inconclusive', reason: 'sampling-not-stated' };
  const spacings = [...used.map((grid) => grid.h), ...(series.comparedTo ? [series.comparedTo.h] : [])];
  const enough = spacings.length >= series.minimumGrids && spansRatio(spacings) && orders.length >= 2;
  if (!enough) return { outcome: 'inconclusive', reason: 'too-few-grids' };
  const errors = used.map((grid) => grid.error).reverse();
  const pairs = orders.flatMap(({ order, uncertainty }) => (order === null || uncertainty === null ? [] : { order, uncertainty })).reverse();
  if (errors.includes(0)) return { outcome: 'inconclusive', reason: 'scatter' };
  return orderRule({ pairs, errors }, judgedBy, tolerance);
}

/** Orders that pass on grids not refined alike may do so by chance; those that fail do not fail by that. */
function onSimilarGrids({ dissimilar }: ErrorSeries, verdict: Verdict): Verdict {
  return dissimilar && verdict.outcome === 'pass' ? { outcome: 'inconclusive', reason: 'not-similar' } : verdict;
}

function checkSeries({ field, norm, grids, comparedTo }: ErrorSeries): void {
  const last = grids.at(-1);
  if (comparedTo && last && !(comparedTo.h > last.h)) throw new RangeError(`h of ${field} (${norm}) on grid ${comparedTo.label} must exceed that of the finer grid, got ${comparedTo.h}`);
  grids.forEach(({ label, h, error, knownError }, index) => {
    const where = `of ${field} (${norm}) on grid ${label}`;
    if (!(h > (grids[index - 1]?.h ?? 0) && Number.isFinite(h))) throw new RangeError(`h ${where} must exceed that of the finer grid, got ${h}`);
    if (!(error >= 0 && Number.isFinite(error))) throw new RangeError(`error ${where} must be 0 or above, got ${error}`);
    if (!(knownError >= 0 && Number.isFinite(knownError))) throw new RangeError(`knownError ${where} must be 0 or above, got ${knownError}`);
  });
}
