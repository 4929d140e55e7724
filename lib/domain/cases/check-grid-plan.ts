import type { FieldProblem } from '@/lib/errors';
import type { CaseDefinition } from './definition';
import { repeated } from './repeated';

export function checkGridPlan(plan: CaseDefinition['gridPlan'], dimension: number): FieldProblem[] {
  return [
    ...repeated(plan.map((grid) => grid.label), (index) => `gridPlan.${index}.label`, 'Grid'),
    ...plan.flatMap(({ cellsPerDirection }, index): FieldProblem[] => {
      if (!Array.isArray(cellsPerDirection) || cellsPerDirection.length === dimension) return [];
      return [{ path: `gridPlan.${index}.cellsPerDirection`, message: `Found ${cellsPerDirection.length} counts. Expected ${dimension}, one for each direction, or one number for all.` }];
    }),
  ];
}
