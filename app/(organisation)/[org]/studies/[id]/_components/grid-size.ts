import { formatCount } from '@/lib/domain/numbers/format-count';
import type { Grid } from '@/lib/domain/studies/schema';
import { spacingLabel } from '@/lib/figures/spacing-label';

type Stated = Pick<Grid, 'cells' | 'cellsPerDirection' | 'h' | 'dt'>;

/** How fine a grid is, as its author stated it: "8 × 8 cells", "64 cells", "h 1/8"; null where only its file tells. */
export function gridSize(grid: Stated, dimension: number): string | null {
  const { cells, cellsPerDirection, h, dt } = grid;
  if (cellsPerDirection !== undefined) {
    const counts = typeof cellsPerDirection === 'number' ? Array<number>(dimension).fill(cellsPerDirection) : cellsPerDirection;
    return `${counts.map(formatCount).join('\u00a0×\u00a0')} cells`;
  }
  if (cells !== undefined) return `${formatCount(cells)} cells`;
  if (h !== undefined) return `h ${spacingLabel(h)}`;
  return dt === undefined ? null : `Δt ${spacingLabel(dt)}`;
}
