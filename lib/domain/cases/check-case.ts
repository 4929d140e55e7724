import type { FieldProblem } from '@/lib/errors';
import type { ProblemDefinition } from '../problems/schema';
import { checkFields } from './check-fields';
import { checkGridPlan } from './check-grid-plan';
import { checkKind } from './check-kind';
import { checkQuantities } from './check-quantities';
import type { CaseDefinition, CaseKind } from './definition';
import { withElementOrders } from './element-orders';

/** What is wrong with a case on its problem: every fault with the path of its member. */
export function checkCase(stated: CaseDefinition, problem: ProblemDefinition, kind: CaseKind): FieldProblem[] {
  const definition = withElementOrders(stated);
  return [
    ...checkKind(definition, kind),
    ...checkFields(definition.fields, problem),
    ...checkQuantities(definition.quantities, kind),
    ...checkGridPlan(definition.gridPlan, problem.dimension),
  ];
}
