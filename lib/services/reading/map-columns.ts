import type { BoundRevision } from '@/db/queries/study-revisions';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { matchColumns, type ColumnMatch } from '@/lib/domain/columns/match-columns';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { definitionOf } from '../studies/grid-definition';
import type { GridRow } from '@/db/queries/grids';

interface Surroundings { mapping: ColumnMapping | null; bound: BoundRevision; grid: Pick<GridRow, 'definition'> }

/** The columns of a file: what the case says, completed by names that match. A time is needed where the grid states none. */
export function mapColumns(header: readonly string[], { mapping, bound, grid }: Surroundings): ColumnMatch {
  const problem = problemDefinitionSchema.parse(bound.problem_definition);
  const declared = caseDefinitionSchema.parse(bound.case_definition).fields;
  const fields = declared.map(({ field }) => field);
  const gradients = declared.filter(({ norms }) => norms.some(({ norm }) => norm === 'H1' || norm === 'energy')).map(({ field }) => field);
  const matched = matchColumns(header, { dimension: problem.dimension, fields, gradients });
  const found = { ...matched.found, ...mapping, fields: { ...matched.found.fields, ...mapping?.fields } };
  const missing = [
    ...fields.filter((field) => !Object.hasOwn(found.fields, field)),
    ...(['x', 'y', 'z'] as const).slice(0, problem.dimension).filter((axis) => found[axis] === undefined),
    ...(found.weight === undefined ? ['weight'] : []),
    ...(problem.unsteady && found.t === undefined && definitionOf(grid).t === undefined ? ['t'] : []),
  ];
  const { x, weight } = found;
  return { found, missing, mapping: missing.length === 0 && x !== undefined && weight !== undefined ? { ...found, x, weight } : null };
}
