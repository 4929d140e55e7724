import type { ErrorSeries, QuantitySeries, SeriesAssessment } from './assessment';
import { judgeErrorSeries } from './outcome/judge-error-series';
import { judgeQuantity } from './outcome/judge-quantity';
import { studyOutcome } from './outcome/study-outcome';
import { numericsVersion } from './version';

/**
 * Assesses a study, or a small table: every field and norm by its errors, every quantity by its values, and the outcome
 * of the whole. Browser, worker and API call this one.
 *
 * Grids may come in any order; the answer runs from the finest to the coarsest. h in any unit, the same within a series.
 * A quantity with a known exact value comes as an error series (errorSeriesOfQuantity). What cannot be computed is null
 * with a reason; a value that is not finite, or two grids of one spacing, throw and name the series.
 */
export function assessSeries(input: { errors: readonly ErrorSeries[]; quantities: readonly QuantitySeries[] }): SeriesAssessment {
  const fields = input.errors.map((series) => judgeErrorSeries({ ...series, grids: finestFirst(series.grids) }));
  const quantities = input.quantities.map((series) => judgeQuantity({ ...series, grids: finestFirst(series.grids) }));
  return { ...studyOutcome(fields, quantities), fields, quantities, numericsVersion };
}

function finestFirst<Grid extends { h: number }>(grids: readonly Grid[]): Grid[] {
  return [...grids].sort((left, right) => left.h - right.h);
}
