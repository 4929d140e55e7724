import type { FieldAssessment } from '../../numerics/assessment';
import { isDrawn } from './figure-fields';

export interface FormalLine {
  order: number;
  /** log10 of the error that the formal order gives at log10 of a spacing. */
  at: (logH: number) => number;
}

/** The formal slope through the finest point that is used; null where there is no formal order or no such point. */
export function formalLine(series: FieldAssessment): FormalLine | null {
  const order = series.derivedOrder ?? series.formalOrder;
  const finest = series.grids.find((grid) => grid.used && isDrawn(grid)) ?? series.grids.find(isDrawn);
  if (order === null || !finest) return null;
  const [logH, logError] = [Math.log10(finest.h), Math.log10(finest.error)];
  return { order, at: (x) => logError + order * (x - logH) };
}
