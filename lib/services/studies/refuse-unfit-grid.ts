import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { checkGrid } from '@/lib/domain/studies/check-grid';
import { refinementSchema, type GridInput } from '@/lib/domain/studies/input';
import { filesTellSpacing } from '@/lib/domain/studies/takes-files';
import { AppError } from '@/lib/errors';
import type { LoadedStudy } from './require-study';

/** Refuses a grid that does not fit the case of its study. */
export function refuseUnfitGrid({ head, bound }: LoadedStudy, grid: GridInput): void {
  const definition = caseDefinitionSchema.parse(bound.case_definition);
  const faults = checkGrid(grid, {
    definition, refinement: refinementSchema.parse(head.refinement), dimension: head.dimension,
    canHaveFile: filesTellSpacing(definition, problemDefinitionSchema.parse(bound.problem_definition)),
  });
  if (faults.length > 0) throw new AppError('invalid', faults[0]?.message ?? 'The grid does not fit the case.', { fields: faults });
}
