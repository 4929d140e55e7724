import type { BoundRevision } from '@/db/queries/study-revisions';
import { caseDefinitionSchema, type DeclaredField } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { matchColumns, type ColumnMatch } from '@/lib/domain/columns/match-columns';
import { splitColumns } from '@/lib/domain/columns/split-columns';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { definitionOf } from '../studies/grid-definition';
import type { GridRow } from '@/db/queries/grids';

interface Surroundings { mapping: ColumnMapping | null; bound: BoundRevision; grid: Pick<GridRow, 'definition'> }

/** The columns of a file: what the case says, completed by names that match. A time is needed where the grid states none. */
export function mapColumns(header: readonly string[], { mapping, bound, grid }: Surroundings): ColumnMatch {
  const problem = problemDefinitionSchema.parse(bound.problem_definition);
  const declared = caseDefinitionSchema.parse(bound.case_definition).fields;
  const fields = declared.map(({ field }) => field);
  const gradients = declared.filter(({ norms }) => norms.some(isOfGradient)).map(({ field }) => field);
  const matched = matchColumns(header, { dimension: problem.dimension, fields, gradients });
  const found = { ...matched.found, ...mapping, fields: { ...matched.found.fields, ...mapping?.fields } };
  const missing = [
    ...declared.flatMap((field) => (mapping?.fields[field.field] === undefined ? lacksOf(field, found.fields[field.field], problem.dimension) : [])),
    ...(['x', 'y', 'z'] as const).slice(0, problem.dimension).filter((axis) => found[axis] === undefined),
    ...(found.weight === undefined ? ['weight'] : []),
    ...(problem.unsteady && found.t === undefined && definitionOf(grid).t === undefined ? ['t'] : []),
  ];
  const { x, weight } = found;
  return { found, missing, mapping: missing.length === 0 && x !== undefined && weight !== undefined ? { ...found, x, weight } : null };
}

const isOfGradient = ({ norm }: DeclaredField['norms'][number]) => norm === 'H1' || norm === 'energy';

/** What the norms of a field ask for and names did not find. That a file is without a gradient is for the mapping to say. */
function lacksOf({ field, norms }: DeclaredField, mapped: string | string[] | undefined, dimension: number): string[] {
  const { value, gradient } = splitColumns(mapped, dimension);
  return [
    ...(value === undefined && !norms.every(isOfGradient) ? [field] : []),
    ...(gradient.length === 0 && norms.some(isOfGradient) ? [`gradient of ${field}`] : []),
  ];
}
