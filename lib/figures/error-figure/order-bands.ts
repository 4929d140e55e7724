import type { SeriesNorm } from '../../numerics/assessment';
import type { FigureField } from './figure-fields';

export interface OrderBand { norms: SeriesNorm[]; formal: number; low: number; high: number; ink: 'band' | 'band2' }

/**
 * The bands [pf − tolerance, pf + 2 tolerance] that the rule judges by, wide ones first; norms with the same band share it.
 * The narrowest about each formal order is the inner one.
 */
export function orderBands({ norms }: FigureField): OrderBand[] {
  const bands: OrderBand[] = [];
  for (const { norm, formalOrder, derivedOrder, tolerance } of norms) {
    const formal = derivedOrder ?? formalOrder;
    if (formal === null || tolerance === null) continue;
    const [low, high] = [formal - tolerance, formal + 2 * tolerance];
    const same = bands.find((band) => Math.abs(band.low - low) < 1e-9 && Math.abs(band.high - high) < 1e-9);
    if (same) same.norms.push(norm);
    else bands.push({ norms: [norm], formal, low, high, ink: 'band' });
  }
  bands.sort((a, b) => b.high - b.low - (a.high - a.low));
  return bands.map((band, place) => {
    const hasInner = bands.slice(place + 1).some((inner) => inner.low >= band.low && inner.high <= band.high);
    return hasInner ? { ...band, ink: 'band2' as const } : band;
  });
}
