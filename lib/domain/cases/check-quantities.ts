import type { FieldProblem } from '@/lib/errors';
import type { CaseKind, DeclaredQuantity } from './definition';
import { repeated } from './repeated';

export function checkQuantities(quantities: readonly DeclaredQuantity[], kind: CaseKind): FieldProblem[] {
  return [
    ...repeated(quantities.map((quantity) => quantity.name), (index) => `quantities.${index}.name`, 'Quantity'),
    ...quantities.flatMap(({ knownValue, target, procedure, formalOrder, uNumFactor }, index): FieldProblem[] => {
      if (knownValue === undefined) {
        const needsOrder = procedure === 'guarded-order' || procedure === 'correction-factor';
        return needsOrder && formalOrder === undefined ? [{ path: `quantities.${index}.formalOrder`, message: `The procedure ${procedure} compares with the formal order. State it, or choose another procedure.` }] : [];
      }
      if (uNumFactor !== undefined) return [{ path: `quantities.${index}.uNumFactor`, message: 'A quantity with a known value is judged by its error and has no u_num. Leave the factor out.' }];
      if (kind === 'solution') {
        return [{ path: `quantities.${index}.knownValue`, message: 'A quantity of a solution case has no known value. Make it a benchmark case.' }];
      }
      if (target === undefined) return [];
      return [{ path: `quantities.${index}.target`, message: 'A quantity with a known value is judged by its error, not by a GCI. Leave the target out.' }];
    }),
  ];
}
