import { noteSpacing } from '@/lib/numerics/spacing/note-spacing';
import type { SpacingNote } from '@/lib/numerics/spacing/spacing-types';
import { formatCount } from '../numbers/format-count';
import { formatValue } from '../numbers/format-value';
import { cellCount } from '../studies/cell-count';
import type { GridInput } from '../studies/input';
import type { Assessment } from './schema';

type Stated = Pick<GridInput, 'label' | 'cells' | 'cellsPerDirection'>;

/** Digits that show a difference of 1e-6. */
const weightDigits = 9;

/**
 * What of the files of a study does not fit the cells stated, or each other: rows that are not cells, and weights that
 * add up to different sums. It wants a look and decides nothing.
 */
export function explainSpacing(grids: readonly Stated[], inputs: Assessment['inputs'], dimension: number): string[] {
  const notes = noteSpacing(inputs.map(({ label, rows, weightSum }) => {
    const grid = grids.find((each) => each.label === label);
    return { label, cells: (grid && cellCount(grid, dimension)) ?? undefined, rows, weightSum: weightSum ?? undefined };
  }));
  const first = inputs.find(({ weightSum }) => typeof weightSum === 'number');
  const rows = notes.filter(({ code }) => code === 'rows-differ-from-cells');
  const weights = notes.filter(({ code }) => code === 'weights-differ');
  return [
    ...rows.slice(0, 1).map(({ label, found, expected }) => (
      `The file of ${label} has ${formatCount(found)} rows, where ${formatCount(expected)} cells are stated${others(rows)}: right for nodes or quadrature points, else a part is missing or twice there.`
    )),
    ...weights.slice(0, 1).map(({ label, found, expected }) => (
      `The weights of ${label} add up to ${print(found)}, those of ${first?.label} to ${print(expected)}${others(weights)}: the grids may not cover the same domain.`
    )),
  ];
}

function others(notes: readonly SpacingNote[]): string {
  const more = notes.length - 1;
  return more === 0 ? '' : `, and ${more} more ${more === 1 ? 'grid differs' : 'grids differ'}`;
}

function print(sum: number): string {
  return formatValue(sum, Math.abs(sum) * 10 ** (2 - weightDigits));
}
