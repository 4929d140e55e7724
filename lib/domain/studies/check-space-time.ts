import type { FieldProblem } from '@/lib/errors';
import { gridSpacing } from '@/lib/numerics/spacing/grid-spacing';
import type { GridInput } from './input';
import { statedSpacing } from './stated-spacing';

/** Fewer leave nothing to tell the two orders, the two sizes and ρ apart by. */
const leastSteps = 3;

/** Whether the grids make a matrix: three spacings and three time steps or more, each of them with each, none twice. */
export function checkSpaceTime(grids: readonly GridInput[], { dimension, volume }: { dimension: number; volume: number | null }): FieldProblem[] {
  const sizes = grids.map((grid) => {
    const { h, cells, cellsPerDirection } = statedSpacing(grid);
    const found = gridSpacing({ label: grid.label, h: h ?? undefined, cells: cells ?? undefined, cellsPerDirection: cellsPerDirection ?? undefined }, { refinement: 'space', dimension, volume });
    return 'code' in found ? null : found.h;
  });
  if (sizes.includes(null)) return [];
  const [spacings, steps] = [new Set(sizes).size, new Set(grids.map(({ dt }) => dt)).size];
  const pairs = new Set(grids.map(({ dt }, index) => `${sizes[index]} ${dt}`));
  if (spacings < leastSteps || steps < leastSteps) {
    return [{ path: 'grids', message: `Found ${spacings} spacings and ${steps} time steps. Refined in space and time, expected at least ${leastSteps} of each; a family of pairs is refined in space with its time steps stated.` }];
  }
  if (pairs.size < grids.length) return [{ path: 'grids', message: 'Two grids have the same spacing and time step. Expected each pair once.' }];
  if (pairs.size < spacings * steps) return [{ path: 'grids', message: `Found ${pairs.size} pairs of ${spacings} spacings and ${steps} time steps. Expected all ${spacings * steps}.` }];
  return [];
}
