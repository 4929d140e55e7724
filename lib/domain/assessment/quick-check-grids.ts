import type { FieldProblem } from '@/lib/errors';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';
import { statedSpacing } from '../studies/stated-spacing';
import type { QuickCheckInput } from './quick-schema';

export type QuickCheckGrid = QuickCheckInput['grids'][number] & { label: string; h: number };

/** The grids with their spacings, finest first; a grid without a label is called by its place in the request. */
export function quickCheckGrids(input: QuickCheckInput): { ok: true; grids: QuickCheckGrid[] } | { ok: false; faults: FieldProblem[] } {
  const labelled = input.grids.map((grid, index) => ({ ...grid, label: grid.label ?? String(index + 1) }));
  const spacing = resolveSpacing({ dimension: input.dimension, grids: labelled.map((grid) => statedSpacing(grid)) });
  if (!spacing.ok) {
    return {
      ok: false,
      faults: spacing.problems.map(({ label, found, expected }) => ({
        path: label === null ? 'grids' : `grids.${labelled.findIndex((grid) => grid.label === label)}`,
        message: `Found ${found}. Expected ${expected}.`,
      })),
    };
  }
  return {
    ok: true,
    grids: spacing.grids.flatMap(({ index, h }) => {
      const grid = labelled[index];
      return grid ? [{ ...grid, h }] : [];
    }),
  };
}
