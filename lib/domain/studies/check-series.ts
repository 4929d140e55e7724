import type { FieldProblem } from '@/lib/errors';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';
import type { CaseDefinition } from '../cases/definition';
import { checkGrid } from './check-grid';
import { checkSpaceTime } from './check-space-time';
import type { GridInput, Refinement } from './input';
import { statedSpacing } from './stated-spacing';

interface Surroundings { definition: CaseDefinition; refinement: Refinement; dimension: number; volume: number | null; canHaveFile: boolean }

/** What of the grids of a new study does not fit the case or each other, each fault with its path in the request. */
export function checkSeries(grids: readonly GridInput[], around: Surroundings): FieldProblem[] {
  const faults = grids.flatMap((grid, index) => checkGrid(grid, around)
    .map(({ path, message }) => ({ path: `grids.${index}.${path}`, message })));
  const repeated = grids.flatMap((grid, index) => (grids.findIndex(({ label }) => label === grid.label) < index
    ? [{ path: `grids.${index}.label`, message: `Two grids have the label ${grid.label}.` }] : []));
  if (faults.length + repeated.length > 0) return [...faults, ...repeated];
  const { refinement } = around;
  return refinement === 'space-time' ? checkSpaceTime(grids, around) : checkTogether(grids, { ...around, refinement });
}

function checkTogether(grids: readonly GridInput[], around: Surroundings & { refinement: 'space' | 'time' }): FieldProblem[] {
  const stated = grids.map((grid) => statedSpacing(grid));
  const areAllStated = stated.every((grid) => resolveSpacing({ grids: [grid], ...around }).ok);
  const spacing = areAllStated ? resolveSpacing({ grids: stated, ...around }) : null;
  if (!spacing || spacing.ok) return [];
  return spacing.problems.map(({ label, found, expected }) => ({
    path: `grids.${Math.max(0, grids.findIndex((grid) => grid.label === label))}`, message: `Grid ${label ?? ''}: ${found}. Expected ${expected}.`,
  }));
}
