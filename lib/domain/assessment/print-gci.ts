import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { formatMeasure } from '../numbers/format-measure';
import { formatPercent } from '../numbers/format-percent';

/** A value under ten of its last changes is near zero: its GCI is stated in the unit alone. */
const largestChange = 0.1;

/** The GCI of the finest grid in percent; in the quantity's unit where the value is too near zero for a fraction of it. */
export function printGci({ gci, gciAbsolute, relativeChange, unit }: QuantityAssessment): string {
  if (gci !== null && relativeChange !== null && relativeChange <= largestChange) return formatPercent(gci);
  return gciAbsolute === null ? '–' : formatMeasure(gciAbsolute, unit);
}
