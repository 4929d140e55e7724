import type { ErrorSeries, QuantitySeries, SeriesAssessment, SpaceTimeSeries } from './assessment';
import type { Similarity } from './mesh/judge-similarity';
import { judgeErrorSeries } from './outcome/judge-error-series';
import { judgeQuantity } from './outcome/judge-quantity';
import { studyOutcome } from './outcome/study-outcome';
import { suggestPatterns, type Surroundings } from './patterns/suggest-patterns';
import { assessSpaceTime } from './space-time/assess-space-time';
import { numericsVersion } from './version';

interface SeriesToAssess {
  errors: readonly ErrorSeries[];
  quantities: readonly QuantitySeries[];
  /** Instead of the others, for a matrix of grids and time steps. */
  spaceTime?: readonly SpaceTimeSeries[];
  /** How alike the grids are refined, where that is known: a pass on grids that are not becomes inconclusive. */
  similarity?: Similarity | null;
  /** What is known beside the norms and may explain their orders. */
  around?: Surroundings;
}

/**
 * Assesses a study, or a small table: every field and norm by its errors, every quantity by its values, and the outcome
 * of the whole. Browser, worker and API call this one.
 *
 * Grids may come in any order; the answer runs from the finest to the coarsest. h in any unit, the same within a series.
 * A quantity with a known exact value comes as an error series (errorSeriesOfQuantity). What cannot be computed is null
 * with a reason. Space and time refined together are fitted and have no outcome; a value that is not finite, or two grids of one spacing, throw and name the series.
 */
export function assessSeries(input: SeriesToAssess): SeriesAssessment {
  if (input.spaceTime) {
    return { outcome: null, reasons: ['no-target'], fields: [], quantities: [], spaceTime: input.spaceTime.map(assessSpaceTime), patterns: [], numericsVersion };
  }
  const { similarity } = input;
  const alike = similarity && !similarity.isSimilar ? { dissimilar: similarity.pairs } : {};
  const fields = input.errors.map((series) => judgeErrorSeries({ ...series, ...alike, grids: finestFirst(series.grids) }));
  const quantities = input.quantities.map((series) => judgeQuantity({ ...series, ...alike, grids: finestFirst(series.grids) }));
  return { ...studyOutcome(fields, quantities), fields, quantities, ...(similarity && { similarity }), patterns: suggestPatterns(fields.filter((field) => field.comparedTo === undefined), input.around), numericsVersion };
}

function finestFirst<Grid extends { h: number }>(grids: readonly Grid[]): Grid[] {
  return [...grids].sort((left, right) => left.h - right.h);
}
