import type { ResolvedSpacing, SpacingProblem, KnownSpacing } from './spacing-types';

/** Two spacings closer than this are the same grid refined by nothing. */
const sameWithin = 1e-9;

/**
 * What contradicts itself over a series: lengths beside bare counts, two grids of one spacing, or a finer grid with
 * fewer cells. `resolved` is sorted, the finest first; `stated` is the request.
 */
export function checkSeriesSpacing(resolved: readonly ResolvedSpacing[], stated: readonly KnownSpacing[], volumeKnown: boolean): SpacingProblem[] {
  const problems: SpacingProblem[] = [];
  const lengths = resolved.find((grid) => grid.basis === 'h' || grid.basis === 'weights');
  const counts = resolved.find((grid) => grid.basis === 'cells' || grid.basis === 'cells-per-direction');
  if (lengths && counts && !volumeKnown) {
    problems.push({
      code: 'mixed-bases', label: counts.label, found: `a count of cells, while grid ${lengths.label} has a length`,
      expected: 'the same statement for every grid, or the volume of the domain',
    });
  }
  for (let i = 1; i < resolved.length; i += 1) {
    const [fine, coarse] = [resolved[i - 1], resolved[i]];
    if (!fine || !coarse) continue;
    if (coarse.h - fine.h <= sameWithin * coarse.h) {
      problems.push({
        code: 'same-spacing', label: coarse.label, found: `h = ${coarse.h}, as grid ${fine.label}`, expected: 'a spacing of its own for every grid',
      });
      continue;
    }
    const [fineCells, coarseCells] = [stated[fine.index]?.cells, stated[coarse.index]?.cells];
    if (fine.basis !== 'time-step' && fineCells !== undefined && coarseCells !== undefined && fineCells < coarseCells) {
      problems.push({
        code: 'order-contradicts', label: fine.label,
        found: `smaller spacing than grid ${coarse.label} (${fine.h} against ${coarse.h}) with fewer cells (${fineCells} against ${coarseCells})`,
        expected: 'more cells at a smaller spacing',
      });
    }
  }
  return problems;
}
