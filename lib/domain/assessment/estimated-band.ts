import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { formatMeasure } from '../numbers/format-measure';
import { formatPercent } from '../numbers/format-percent';

/** A value under ten of its last changes is near zero: its band is stated in the unit alone. */
const largestChange = 0.1;

/** The uncertainty of the finest grid: a GCI, or the U of procedures that give that instead. */
interface EstimatedBand { name: 'GCI' | 'U'; longName: string; fraction: number | null; absolute: number | null }

type Estimated = Pick<QuantityAssessment, 'procedure' | 'branch' | 'gci' | 'gciAbsolute' | 'uncertainty' | 'uncertaintyFraction'>;

export function estimatedBand({ procedure, branch, gci, gciAbsolute, uncertainty = null, uncertaintyFraction = null }: Estimated): EstimatedBand {
  const isU = (procedure === 'least-squares' || procedure === 'correction-factor') && branch !== 'formal-two-grids';
  return isU
    ? { name: 'U', longName: 'uncertainty U', fraction: uncertaintyFraction, absolute: uncertainty }
    : { name: 'GCI', longName: 'grid convergence index', fraction: gci, absolute: gciAbsolute };
}

/** The band in percent; in the quantity's unit where the value is too near zero for a fraction of it. */
export function printBand(quantity: QuantityAssessment): string {
  const { fraction, absolute } = estimatedBand(quantity);
  const { relativeChange, unit } = quantity;
  if (fraction !== null && relativeChange !== null && relativeChange <= largestChange) return formatPercent(fraction);
  return absolute === null ? '–' : formatMeasure(absolute, unit);
}
