import type { QuantityAssessment } from '../../numerics/assessment';

export interface UncertaintyBar { h: number; value: number; half: number }

/** Bars in the quantity's unit: the index on the finest grid and on the one before it, U on every grid that has one, or half the range where there is neither. */
export function uncertaintyBars({ values, gciAbsolute, gciCoarse, halfRange, uncertainty = null, fit = null }: QuantityAssessment): UncertaintyBar[] {
  const [finest, second] = values;
  const bars: UncertaintyBar[] = [];
  if (fit !== null) return values.flatMap(({ h, value }, index) => (fit.uncertainty[index] === undefined ? [] : [{ h, value, half: fit.uncertainty[index] }]));
  if (finest && uncertainty !== null) bars.push({ ...finest, half: uncertainty });
  else if (finest && gciAbsolute !== null) bars.push({ ...finest, half: gciAbsolute });
  else if (finest && halfRange !== null) bars.push({ ...finest, half: halfRange });
  if (second && gciAbsolute !== null && gciCoarse !== null) bars.push({ ...second, half: gciCoarse * Math.abs(second.value) });
  return bars.map(({ h, value, half }) => ({ h, value, half }));
}
