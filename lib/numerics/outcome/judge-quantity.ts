import type { QuantityAssessment, QuantitySeries, Triple } from '../assessment';
import { orderRange } from '../order/order-range';
import { oscillatingFormula } from '../order/oscillating-formula';
import { numericalUncertainty } from '../uncertainty/numerical-uncertainty';
import { procedureFigures } from '../uncertainty/procedure-figures';
import { quantityRule } from './quantity-rule';
import { quantityTriples } from './quantity-triples';

/**
 * Order, extrapolation, GCI and outcome of a quantity without an exact solution, by the procedure declared for
 * it; two grids take the formal order with a safety factor of 3. Grids run finest first, h in any unit.
 *
 * No extrapolated value where the values oscillate, diverge or do not change: half their range instead (procedureFigures).
 * Throws where spacings do not rise or a value is not finite.
 */
export function judgeQuantity(series: QuantitySeries): QuantityAssessment {
  checkSeries(series);
  const { grids, triples, areApart } = quantityTriples(series);
  const [last] = triples;
  const { orderObserved = last?.order ?? null, ...figures } = procedureFigures(series.procedure, { all: series.grids, grids, last, formalOrder: series.formalOrder });
  const verdict = quantityRule(series, { grids, triples, areApart, band: figures.gci ?? figures.uncertaintyFraction });
  return {
    name: series.name, unit: series.unit, formalOrder: series.formalOrder, target: series.target,
    values: series.grids.map(({ label, h, value }) => ({ label, h, value })),
    convergence: last?.convergence ?? null,
    orderObserved,
    orderRange: last && last.order !== null ? orderRange(...last.grids) : null,
    formulaValue: last ? oscillatingFormula(last.differences) : null,
    procedure: series.procedure, ...figures, ...standardUncertainty(series, figures.gciAbsolute ?? figures.uncertainty),
    triples: triples.map((triple): Triple => ({
      grids: triple.grids.map((grid) => grid.label), order: triple.order, convergence: triple.convergence,
    })),
    ...verdict, ...(verdict.reasons.includes('not-similar') && { dissimilar: [...(series.dissimilar ?? [])] }),
  };
}

/** u_num where its factor is stated; the parts of iteration and time step are those of the finest grid. */
function standardUncertainty({ uNumFactor: factor, grids }: QuantitySeries, band: number | null): { uNum?: number | null } {
  if (factor === null) return {};
  const { iterativeError: iterative = 0, timeError: time = 0 } = grids[0] ?? {};
  return { uNum: numericalUncertainty(band, { factor, iterative, time }) };
}

function checkSeries({ name, grids }: QuantitySeries): void {
  grids.forEach(({ label, h, value }, index) => {
    if (!(h > (grids[index - 1]?.h ?? 0) && Number.isFinite(h))) {
      throw new RangeError(`h of ${name} on grid ${label} must exceed that of the finer grid, got ${h}`);
    }
    if (!Number.isFinite(value)) throw new RangeError(`value of ${name} on grid ${label} must be finite, got ${value}`);
  });
}
