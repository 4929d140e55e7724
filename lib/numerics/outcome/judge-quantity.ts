import type { QuantityAssessment, QuantitySeries, Triple } from '../assessment';
import { orderRange } from '../order/order-range';
import { oscillatingFormula } from '../order/oscillating-formula';
import { relativeSize } from '../uncertainty/relative-size';
import { threeGridFigures } from '../uncertainty/three-grid-figures';
import { quantityRule } from './quantity-rule';
import { quantityTriples, type PrintedGrid, type QuantityTriple } from './quantity-triples';

type Figures = Pick<QuantityAssessment, 'extrapolated' | 'relativeChange' | 'extrapolatedError' | 'safetyFactor' | 'gci' | 'gciAbsolute'
  | 'gciCoarse' | 'asymptoticRatio' | 'orderUsed' | 'branch' | 'halfRange'>;

const noFigures: Figures = {
  extrapolated: null, relativeChange: null, extrapolatedError: null, safetyFactor: null, gci: null, gciAbsolute: null, gciCoarse: null,
  asymptoticRatio: null, orderUsed: null, branch: 'none', halfRange: null,
};

/**
 * Order, extrapolation, GCI and outcome of a quantity without an exact solution, by the three-grid procedure on its three
 * finest grids; two grids take the formal order with a safety factor of 3. Grids run finest first, h in any unit.
 *
 * No extrapolated value and no GCI where the values oscillate, diverge or do not change: half their range instead.
 * Throws where spacings do not rise or a value is not finite.
 */
export function judgeQuantity(series: QuantitySeries): QuantityAssessment {
  checkSeries(series);
  const { grids, triples, areApart } = quantityTriples(series);
  const [last] = triples;
  const figures = last ? figuresOf(last) : formalFigures(grids, series.formalOrder);
  return {
    name: series.name, unit: series.unit, formalOrder: series.formalOrder, target: series.target,
    values: series.grids.map(({ label, h, value }) => ({ label, h, value })),
    convergence: last?.convergence ?? null,
    orderObserved: last?.order ?? null,
    orderRange: last && last.order !== null ? orderRange(...last.grids) : null,
    formulaValue: last ? oscillatingFormula(last.differences) : null,
    procedure: 'three-grid', ...figures,
    triples: triples.map((triple): Triple => ({
      grids: triple.grids.map((grid) => grid.label), order: triple.order, convergence: triple.convergence,
    })),
    ...quantityRule(series, { grids, triples, areApart, gci: figures.gci }),
  };
}

function figuresOf({ grids: [fine, middle, coarse], convergence, order }: QuantityTriple): Figures {
  if (convergence === 'monotone' && order !== null && order > 0) {
    return { ...noFigures, ...threeGridFigures(fine, middle, coarse, order), orderUsed: order, branch: 'observed' };
  }
  const values = [fine.value, middle.value, coarse.value];
  return {
    ...noFigures, halfRange: (Math.max(...values) - Math.min(...values)) / 2,
    relativeChange: relativeSize(middle.value - fine.value, fine.value),
  };
}

function formalFigures([fine, coarse]: readonly PrintedGrid[], formalOrder: number | null): Figures {
  if (!fine || !coarse) return noFigures;
  if (formalOrder === null) {
    return { ...noFigures, relativeChange: relativeSize(coarse.value - fine.value, fine.value) };
  }
  return { ...noFigures, ...threeGridFigures(fine, coarse, null, formalOrder), orderUsed: formalOrder, branch: 'formal-two-grids' };
}

function checkSeries({ name, grids }: QuantitySeries): void {
  grids.forEach(({ label, h, value }, index) => {
    if (!(h > (grids[index - 1]?.h ?? 0) && Number.isFinite(h))) {
      throw new RangeError(`h of ${name} on grid ${label} must exceed that of the finer grid, got ${h}`);
    }
    if (!Number.isFinite(value)) throw new RangeError(`value of ${name} on grid ${label} must be finite, got ${value}`);
  });
}
