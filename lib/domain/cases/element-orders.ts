import { elementOrder } from '@/lib/numerics/outcome/element-order';
import type { CaseDefinition, DeclaredField, DeclaredNorm } from './definition';

type Declared = Pick<CaseDefinition, 'fields' | 'quantities' | 'elements'>;

/** From this order on, and for gradients, values at nodes fall faster than the solution between them. */
const superconverges = 3;

/** The order that the elements of a case promise for a field and norm; null where it states none. */
export function orderOfElements({ elements }: Pick<CaseDefinition, 'elements'>, { compare }: DeclaredField, { norm }: DeclaredNorm): number | null {
  return elements ? elementOrder(norm, elements.degree, isDerivative(compare)) : null;
}

/** The same case with the orders of its elements where it states no formal order; of quantities, of those that are energies. */
export function withElementOrders<Case extends Declared>(definition: Case): Case {
  const { elements } = definition;
  if (!elements) return definition;
  return {
    ...definition,
    fields: definition.fields.map((field) => ({
      ...field, norms: field.norms.map((norm) => (norm.expectExact ? norm : { ...norm, formalOrder: norm.formalOrder ?? orderOfElements(definition, field, norm) ?? undefined })),
    })),
    quantities: definition.quantities.map((quantity) => (quantity.energyLike ? { ...quantity, formalOrder: quantity.formalOrder ?? elementOrder('value', elements.degree) } : quantity)),
  };
}

/** Whether a norm of finite elements shows its order only at quadrature points, and the case does not say that values are there. */
export function lacksQuadrature({ elements, sampling }: Pick<CaseDefinition, 'elements' | 'sampling'>, { compare }: DeclaredField, { norm, formalOrder, derivedOrder }: DeclaredNorm): boolean {
  if (!elements || sampling === 'quadrature') return false;
  return norm === 'H1' || norm === 'energy' || isDerivative(compare) || (derivedOrder ?? formalOrder ?? 0) >= superconverges;
}

function isDerivative(compare: string | undefined): boolean {
  return compare !== undefined && /\bd\s*\(/.test(compare);
}
