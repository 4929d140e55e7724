import type { Procedure } from '../assessment';
import type { PrintedGrid, QuantityTriple } from '../outcome/quantity-triples';
import { correctionConstants, correctionFactor } from './correction-factor';
import { gridConvergenceIndex } from './grid-convergence-index';
import { guardedConstants, guardedOrder } from './guarded-order';
import { leastSquaresFigures } from './least-squares-figures';
import { noFigures, type ProcedureFigures } from './procedure-figures-type';
import { relativeSize } from './relative-size';
import { richardson } from './richardson';
import { threeGridFigures } from './three-grid-figures';

interface Observed { all: readonly { h: number; value: number }[]; grids: readonly PrintedGrid[]; last: QuantityTriple | undefined; formalOrder: number | null }

/**
 * Extrapolated value and uncertainty of the finest grid by the procedure named, with the branch it took and the constants
 * it used. `all` are the grids as they come, `grids` those at a ratio of 1.3 or more. Two grids show no order: the formal one is assumed with a safety factor of 3, whatever the procedure.
 *
 * Guarded order and correction factor need a formal order and give nothing but the last change without one. Where the
 * values oscillate, diverge or do not change there is no extrapolated value, and half their range is given; the guarded
 * procedure then still has a band.
 */
export function procedureFigures(procedure: Procedure, observed: Observed): ProcedureFigures {
  const { all, grids, last, formalOrder } = observed;
  if (!last) return formalFigures(grids, formalOrder);
  switch (procedure) {
    case 'three-grid': return threeGrid(last);
    case 'guarded-order': return formalOrder === null ? changeAlone(last) : guarded(last, formalOrder);
    case 'correction-factor': return formalOrder === null ? changeAlone(last) : corrected(last, formalOrder);
    case 'least-squares': {
      const figures = leastSquaresFigures(all);
      return figures.branch === 'none' ? changeAlone(last) : { ...figures, halfRange: isConverging(last) ? null : halfRange(last) };
    }
  }
}

function isConverging(triple: QuantityTriple): triple is QuantityTriple & { order: number } {
  return triple.convergence === 'monotone' && triple.order !== null && triple.order > 0;
}

function halfRange({ grids }: QuantityTriple): number {
  const values = grids.map(({ value }) => value);
  return (Math.max(...values) - Math.min(...values)) / 2;
}

function changeAlone(triple: QuantityTriple): ProcedureFigures {
  const [fine, middle] = triple.grids;
  return { ...noFigures, halfRange: isConverging(triple) ? null : halfRange(triple), relativeChange: relativeSize(middle.value - fine.value, fine.value) };
}

function threeGrid(triple: QuantityTriple): ProcedureFigures {
  if (!isConverging(triple)) return changeAlone(triple);
  const figures = threeGridFigures(...triple.grids, triple.order);
  return { ...noFigures, ...figures, orderUsed: triple.order, branch: 'observed', constants: { safetyFactor: figures.safetyFactor } };
}

function guarded(triple: QuantityTriple, formalOrder: number): ProcedureFigures {
  const [fine, middle, coarse] = triple.grids;
  const { order, safetyFactor, branch } = guardedOrder(triple.convergence === 'monotone' ? triple.order : null, formalOrder);
  const { fraction: gci, absolute: gciAbsolute } = gridConvergenceIndex({ fine, coarse: middle }, order, safetyFactor);
  const extrapolated = isConverging(triple) ? richardson(fine, middle, order) : null;
  return {
    ...changeAlone(triple), orderUsed: order, branch, safetyFactor, gci, gciAbsolute,
    gciCoarse: gridConvergenceIndex({ fine: middle, coarse }, order, safetyFactor).fraction, extrapolated,
    extrapolatedError: extrapolated === null ? null : relativeSize(extrapolated - fine.value, extrapolated),
    constants: { safetyFactor, agreement: guardedConstants.agreement, lowestOrder: guardedConstants.lowest },
  };
}

function corrected(triple: QuantityTriple, formalOrder: number): ProcedureFigures {
  if (!isConverging(triple)) return changeAlone(triple);
  const [fine, middle] = triple.grids;
  const { correctionFactor: factor, multiplier, uncertainty, branch } = correctionFactor({ fine, middle }, triple.order, formalOrder);
  const extrapolated = richardson(fine, middle, triple.order);
  return {
    ...changeAlone(triple), orderUsed: triple.order, branch, extrapolated, extrapolatedError: relativeSize(extrapolated - fine.value, extrapolated),
    uncertainty, uncertaintyFraction: relativeSize(uncertainty, fine.value),
    constants: { correctionFactor: factor, multiplier, nearLimit: correctionConstants.near },
  };
}

function formalFigures([fine, coarse]: readonly PrintedGrid[], formalOrder: number | null): ProcedureFigures {
  if (!fine || !coarse) return noFigures;
  if (formalOrder === null) return { ...noFigures, relativeChange: relativeSize(coarse.value - fine.value, fine.value) };
  const figures = threeGridFigures(fine, coarse, null, formalOrder);
  return { ...noFigures, ...figures, orderUsed: formalOrder, branch: 'formal-two-grids', constants: { safetyFactor: figures.safetyFactor } };
}
