import { checkSeriesSpacing } from './check-series-spacing';
import { gridSpacing } from './grid-spacing';
import type { KnownSpacing, ResolvedSpacing, SpacingProblem, StatedSpacing } from './spacing-types';

interface SpacingRequest {
  grids: readonly StatedSpacing[];
  refinement?: 'space' | 'time';
  dimension?: number | null;
  /** Length, area or volume of the domain; null where unknown, read as 1. */
  volume?: number | null;
}

type SpacingResult =
  | { ok: true; grids: ResolvedSpacing[] }
  | { ok: false; problems: SpacingProblem[] };

/**
 * Finds the spacing h of every grid and sorts the grids, the finest first.
 *
 * In this order: h as stated; cells as (V/N)^(1/D); cells per direction n as V^(1/D)/n; the mean weight of the rows as
 * (Σw/rows)^(1/D). Refined in time, h is the time step. V is 1 where unknown: only ratios matter, so scaling every h
 * changes no order. A count of rows that differs from the cells stated is no problem but a note (noteSpacing).
 * Returns problems instead of spacings where something is missing, not positive or contradicts itself.
 */
export function resolveSpacing(request: SpacingRequest): SpacingResult {
  const { refinement = 'space', dimension = null, volume = null } = request;
  const grids = request.grids.map(dropNulls);
  const problems: SpacingProblem[] = [];
  const resolved: ResolvedSpacing[] = [];
  grids.forEach((grid, index) => {
    const found = gridSpacing(grid, { refinement, dimension, volume });
    if ('code' in found) problems.push(found);
    else resolved.push({ label: grid.label, ...found, index });
  });
  if (problems.length > 0) return { ok: false, problems };
  resolved.sort((left, right) => left.h - right.h || left.index - right.index);
  const contradictions = checkSeriesSpacing(resolved, grids, volume !== null);
  if (contradictions.length > 0) return { ok: false, problems: contradictions };
  return { ok: true, grids: resolved };
}

function dropNulls({ label, h, cells, cellsPerDirection, weightSum, rows, dt }: StatedSpacing): KnownSpacing {
  return {
    label, h: h ?? undefined, cells: cells ?? undefined, cellsPerDirection: cellsPerDirection ?? undefined,
    weightSum: weightSum ?? undefined, rows: rows ?? undefined, dt: dt ?? undefined,
  };
}
