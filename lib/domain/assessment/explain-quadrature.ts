import type { FieldAssessment } from '@/lib/numerics/assessment';
import type { Explanation } from './explanation';

/** Why a norm of finite elements is not judged by values at nodes. `last` is the order of the finest pair, printed. */
export function explainQuadrature({ degree }: NonNullable<FieldAssessment['elements']>, last: string): Explanation {
  return {
    sentence: `Elements of degree ${degree} are stated${last === '–' ? '' : ` and the finest pair shows ${last}`}, but not that values are at quadrature points: at nodes they fall faster than the solution between them, and degree 2 can show 4 for a true 3.`,
    nextStep: `Write rows at quadrature points, ${degree + 2} or more along each direction, with weights times Jacobian, or state norms that the solver computed so; and state quadrature points in the case.`,
  };
}
