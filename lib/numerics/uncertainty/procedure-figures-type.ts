import type { QuantityAssessment } from '../assessment';

/** What a procedure adds to a quantity. */
export type ProcedureFigures = Required<Pick<QuantityAssessment, 'extrapolated' | 'relativeChange' | 'extrapolatedError' | 'safetyFactor' | 'gci' | 'gciAbsolute'
  | 'gciCoarse' | 'asymptoticRatio' | 'orderUsed' | 'branch' | 'halfRange' | 'fit' | 'uncertainty' | 'uncertaintyFraction' | 'constants'>> & {
  /** Given by a procedure that sees an order of its own; undefined leaves that of the three finest grids. */
  orderObserved?: number | null;
};

export const noFigures: ProcedureFigures = {
  extrapolated: null, relativeChange: null, extrapolatedError: null, safetyFactor: null, gci: null, gciAbsolute: null, gciCoarse: null,
  asymptoticRatio: null, orderUsed: null, branch: 'none', halfRange: null, fit: null, uncertainty: null, uncertaintyFraction: null, constants: {},
};
