import { createBlockEvaluator } from './block-evaluator';
import type { Node, Variable } from './node';

/**
 * The values of nodes at one point, in their order. NaN or an infinity where an expression is not defined at the point.
 * For more than a few points use createBlockEvaluator.
 */
export function evaluateAt(nodes: readonly Node[], point: Partial<Record<Variable, number>>): number[] {
  return createBlockEvaluator(nodes, 1)(1, point).map((column) => column[0] as number);
}
