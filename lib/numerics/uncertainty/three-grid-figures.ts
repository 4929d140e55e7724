import { gridConvergenceIndex } from './grid-convergence-index';
import { relativeSize } from './relative-size';
import { richardson } from './richardson';

interface GridValue { h: number; value: number }

/** Celik et al. 2008 for an observed order; P. J. Roache 1994 for one that was assumed. */
const safetyFactors = { observed: 1.25, assumed: 3 } as const;

interface GridFigures {
  extrapolated: number;
  relativeChange: number | null;
  extrapolatedError: number | null;
  safetyFactor: number;
  gci: number | null;
  gciAbsolute: number;
  gciCoarse: number | null;
  asymptoticRatio: number | null;
}

/**
 * The figures of the three-grid procedure for a positive order: extrapolated value, e_a = |(φ1−φ2)/φ1|,
 * e_ext = |(φ_ext−φ1)/φ_ext|, GCI of the fine and of the coarse pair (fractions, and in the quantity's unit), and
 * GCI32/(r21^p·GCI21). I. B. Celik et al., J. Fluids Eng. 130 (2008) 078001.
 *
 * Without `coarse` (two grids) the order was assumed: the safety factor is 3 and nothing is said of a coarse pair.
 * With p from the same three grids the last ratio equals |φ1/φ2| identically, so it decides nothing.
 * Fractions are null where the value they divide by is 0. Throws for an order of 0 or less.
 */
export function threeGridFigures(fine: GridValue, middle: GridValue, coarse: GridValue | null, order: number): GridFigures {
  const safetyFactor = coarse ? safetyFactors.observed : safetyFactors.assumed;
  const extrapolated = richardson(fine, middle, order);
  const { fraction: gci, absolute: gciAbsolute } = gridConvergenceIndex({ fine, coarse: middle }, order, safetyFactor);
  const gciCoarse = coarse ? gridConvergenceIndex({ fine: middle, coarse }, order, safetyFactor).fraction : null;
  return {
    extrapolated,
    relativeChange: relativeSize(middle.value - fine.value, fine.value),
    extrapolatedError: relativeSize(extrapolated - fine.value, extrapolated),
    safetyFactor, gci, gciAbsolute, gciCoarse,
    asymptoticRatio: gci === null || gciCoarse === null ? null : relativeSize(gciCoarse, (middle.h / fine.h) ** order * gci),
  };
}
