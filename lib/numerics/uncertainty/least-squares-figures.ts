import type { ValueFit } from '../assessment';
import { relativeSize } from './relative-size';
import { noFigures, type ProcedureFigures } from './procedure-figures-type';
import { fitFixedTerms, fitPowerTerm, searchBounds, type FittedValues } from './value-fit';

interface GridValue { h: number; value: number }

/** Eça and Hoekstra: the order of a fit that is taken as found, and the order up to which it is trusted. */
const trusted = { lowest: 0.5, highest: 2, withSlack: 2.1 } as const;
const safetyFactors = { trusted: 1.25, otherwise: 3 } as const;

/**
 * The least-squares procedure over all grids, the finest first. Fit: φ0 + αh^p, weighted or not, whichever has the smaller
 * spread σ of those with 0.5 ≤ p ≤ 2; for p > 2 the smallest σ of αh and αh²; for p < 0.5 of these and α1h + α2h².
 * Safety factor 1.25 where 0.5 ≤ p < 2.1 and σ < Δφ = (max − min)/(n − 1), else 3. With δ = φ_i − φ0:
 * U_i = Fs|δ| + σ + |φ_i − fit_i| where σ < Δφ, else 3(σ/Δφ)(|δ| + σ + |φ_i − fit_i|).
 * L. Eça and M. Hoekstra, J. Comput. Phys. 262 (2014) 104–130, as remembered.
 *
 * Made for nominally second-order codes. U is an uncertainty of about 95 %, and no GCI. No figures with fewer than four
 * grids, or where all values are the same.
 */
export function leastSquaresFigures(grids: readonly GridValue[]): ProcedureFigures {
  const values = grids.map(({ value }) => value);
  const dataRange = (Math.max(...values) - Math.min(...values)) / (grids.length - 1);
  const powers = both((weighted) => fitPowerTerm(grids, weighted));
  const observed = smallest(powers.filter(isTrusted)) ?? smallest(powers);
  if (!observed || !(dataRange > 0)) return noFigures;
  const chosen = isTrusted(observed) ? observed : smallest(fallbacks(grids, (observed.order ?? 0) < trusted.lowest));
  const [finest] = grids;
  if (!chosen || !finest) return noFigures;
  const { fitted, ...fit } = chosen;
  const order = observed.order ?? 0;
  const isSmooth = chosen.sigma < dataRange;
  const safetyFactor = order >= trusted.lowest && order < trusted.withSlack && isSmooth ? safetyFactors.trusted : safetyFactors.otherwise;
  const uncertainty = grids.map(({ value }, i) => {
    const [delta, misfit] = [Math.abs(value - chosen.value0), Math.abs(value - (fitted[i] ?? value))];
    return isSmooth ? safetyFactor * delta + chosen.sigma + misfit : safetyFactors.otherwise * (chosen.sigma / dataRange) * (delta + chosen.sigma + misfit);
  });
  const valueFit: ValueFit = { ...fit, atBound: observed.atBound, dataRange, uncertainty };
  return {
    ...noFigures, branch: chosen.kind, orderObserved: observed.atBound === null ? observed.order : null, orderUsed: chosen.order,
    extrapolated: chosen.value0, safetyFactor, fit: valueFit,
    relativeChange: relativeSize((grids[1]?.value ?? finest.value) - finest.value, finest.value),
    extrapolatedError: relativeSize(chosen.value0 - finest.value, chosen.value0),
    uncertainty: uncertainty[0] ?? null, uncertaintyFraction: relativeSize(uncertainty[0] ?? 0, finest.value),
    constants: { safetyFactor, lowestOrderTaken: trusted.lowest, highestOrderTaken: trusted.highest, lowestOrderSearched: searchBounds.lowest, highestOrderSearched: searchBounds.highest },
  };
}

function isTrusted({ order }: FittedValues): boolean {
  return order !== null && order >= trusted.lowest && order <= trusted.highest;
}

function fallbacks(grids: readonly GridValue[], isSlow: boolean): FittedValues[] {
  const kinds = isSlow ? (['first-term', 'second-term', 'two-terms'] as const) : (['first-term', 'second-term'] as const);
  return kinds.flatMap((kind) => both((weighted) => fitFixedTerms(grids, kind, weighted)));
}

function both(fit: (weighted: boolean) => FittedValues | null): FittedValues[] {
  return [true, false].flatMap((weighted) => fit(weighted) ?? []);
}

function smallest(fits: readonly FittedValues[]): FittedValues | undefined {
  return fits.reduce<FittedValues | undefined>((best, fit) => (best && best.sigma <= fit.sigma ? best : fit), undefined);
}
