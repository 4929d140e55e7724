import type { GridRow } from '@/db/queries/grids';
import type { GridInput } from '@/lib/domain/studies/input';
import type { GridState } from '@/lib/domain/studies/schema';
import type { GridNorms } from '@/lib/numerics/norms/grid-norms';

export type GridDefinition = Omit<GridInput, 'label'>;

/** JSON columns of a grid as what was written into them. */
export function definitionOf(row: Pick<GridRow, 'definition'>): GridDefinition {
  return row.definition as unknown as GridDefinition;
}

export function normsOf(row: Pick<GridRow, 'norms'>): GridNorms | null {
  return row.norms as unknown as GridNorms | null;
}

export function stateOf(row: Pick<GridRow, 'state'>): GridState {
  return row.state as GridState;
}
