import type { Procedure, QuantityAssessment, ValueFit } from '@/lib/numerics/assessment';
import { formatMeasure } from '../numbers/format-measure';
import { formatOrder } from '../numbers/format-order';
import { formatPercent } from '../numbers/format-percent';

export const procedureNames: Record<Procedure, string> = {
  'three-grid': 'Three-grid procedure', 'guarded-order': 'Guarded order', 'least-squares': 'Least squares', 'correction-factor': 'Correction factor',
};

/** Where each procedure comes from, as a note prints it. */
export const procedureSources: Record<Procedure, string> = {
  'three-grid': 'Celik, Ghia, Roache, Freitas and others, J. Fluids Eng. 130, 078001, 2008.',
  'guarded-order': 'Oberkampf and Roy, Verification and Validation in Scientific Computing, 2010, section 8.7.',
  'least-squares': 'Eça and Hoekstra, J. Comput. Phys. 262, 104, 2014.',
  'correction-factor': 'Stern, Wilson, Coleman and Paterson, J. Fluids Eng. 123, 793, 2001; ITTC 7.5-03-01-01.',
};

const madeForOrder = 2;

/** How the uncertainty of a quantity came about: procedure, the way it went and the constants it took, and what to mind. */
export function explainProcedure(quantity: QuantityAssessment): string {
  return [`${procedureNames[quantity.procedure]}: ${explainBranch(quantity)}.`, ...cautions(quantity), ...uNumWords(quantity)].join(' ');
}

function explainBranch({ branch, procedure, orderObserved, orderUsed, safetyFactor, formalOrder, constants = {}, fit = null, values }: QuantityAssessment): string {
  const [observed, used] = [orderObserved === null ? 'none' : formatOrder(orderObserved), orderUsed === null ? 'none' : formatOrder(orderUsed)];
  switch (branch) {
    case 'observed': return `observed order ${used}, safety factor ${safetyFactor ?? '–'}`;
    case 'formal-two-grids': return `two grids show no order, so the formal order ${used} is taken with safety factor ${safetyFactor ?? '–'}`;
    case 'near-formal': return `observed order ${observed} is within ${formatPercent(constants.agreement ?? 0)} of the formal order ${used}, which is taken with safety factor ${safetyFactor ?? '–'}`;
    case 'off-formal': return `observed order ${observed} is more than ${formatPercent(constants.agreement ?? 0)} from the formal order ${formalOrder ?? '–'}; order ${used} is taken with safety factor ${safetyFactor ?? '–'}`;
    case 'order-undefined': return `no positive order is observed; order ${used} is taken with safety factor ${safetyFactor ?? '–'}`;
    case 'near-asymptotic': case 'far-from-asymptotic':
      return `observed order ${used} gives correction factor ${(constants.correctionFactor ?? 0).toPrecision(3)}, ${branch === 'near-asymptotic' ? 'near' : 'not near'} 1, and a multiplier of ${(constants.multiplier ?? 0).toPrecision(3)}`;
    case 'power': case 'first-term': case 'second-term': case 'two-terms': return explainFit(fit, { observed, safetyFactor, grids: values.length });
    case 'none': return explainNone(procedure, { formalOrder, grids: values.length });
  }
}

const forms = { power: 'φ = φ0 + αh^p', 'first-term': 'φ = φ0 + αh', 'second-term': 'φ = φ0 + αh²', 'two-terms': 'φ = φ0 + α1h + α2h²' } as const;

function explainFit(fit: ValueFit | null, { observed, safetyFactor, grids }: { observed: string; safetyFactor: number | null; grids: number }): string {
  if (fit === null) return 'no fit';
  const order = observed === 'none' ? 'the fitted order ends at a bound of the search' : `fitted order ${observed}`;
  return `${order}; ${forms[fit.kind]} over ${grids} grids, ${fit.weighted ? 'weighted by 1/h' : 'not weighted'}, leaves a spread of ${formatMeasure(fit.sigma)} against a data range of ${formatMeasure(fit.dataRange)}; safety factor ${safetyFactor ?? '–'}`;
}

function explainNone(procedure: Procedure, { formalOrder, grids }: { formalOrder: number | null; grids: number }): string {
  if (procedure === 'least-squares' && grids < 4) return 'a fit takes four grids or more, so there is no uncertainty';
  if (formalOrder === null && (procedure === 'guarded-order' || procedure === 'correction-factor' || grids < 3)) return 'it needs a formal order, so there is no uncertainty';
  return 'the values do not converge monotonically, so there is no uncertainty';
}

function cautions({ procedure, branch, formalOrder, fit = null }: QuantityAssessment): string[] {
  return [
    ...(procedure === 'least-squares' && formalOrder !== null && formalOrder !== madeForOrder ? [`It was made for nominally second-order codes; here the formal order is ${formalOrder}.`] : []),
    ...(fit !== null && fit.sigma >= fit.dataRange ? ['The values scatter more than they converge.'] : []),
    ...(branch === 'far-from-asymptotic' ? ['The grids are not yet in the asymptotic range.'] : []),
  ];
}

function uNumWords({ uNum = null, unit }: QuantityAssessment): string[] {
  return uNum === null ? [] : [`Standard uncertainty of the finest grid: ${formatMeasure(uNum, unit)}.`];
}
