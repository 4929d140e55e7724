import type { SpacingBasis, SpacingProblem, KnownSpacing } from './spacing-types';

interface Surroundings { refinement: 'space' | 'time'; dimension: number | null; volume: number | null }

/**
 * The spacing of one grid and what it was read from; a problem where it cannot be read.
 * See resolveSpacing for the order in which statements count.
 */
export function gridSpacing(grid: KnownSpacing, around: Surroundings): { h: number; basis: SpacingBasis } | SpacingProblem {
  const { label } = grid;
  const fault = firstNotPositive(grid);
  if (fault) return { code: 'not-positive', label, found: `${fault[0]} ${fault[1]}`, expected: `${fault[0]} above 0` };
  if (around.refinement === 'time') {
    return grid.dt === undefined ? missing(label, 'a time step') : { h: grid.dt, basis: 'time-step' };
  }
  if (grid.h !== undefined) return { h: grid.h, basis: 'h' };
  const { dimension } = around;
  const volume = around.volume ?? 1;
  if (grid.cellsPerDirection !== undefined && grid.cells === undefined) {
    if (dimension === null && around.volume === null) return { h: 1 / grid.cellsPerDirection, basis: 'cells-per-direction' };
    if (dimension === null) return dimensionMissing(label);
    return { h: volume ** (1 / dimension) / grid.cellsPerDirection, basis: 'cells-per-direction' };
  }
  if (grid.cells !== undefined) {
    return dimension === null ? dimensionMissing(label) : { h: (volume / grid.cells) ** (1 / dimension), basis: 'cells' };
  }
  if (grid.weightSum !== undefined && grid.rows !== undefined) {
    return dimension === null ? dimensionMissing(label) : { h: (grid.weightSum / grid.rows) ** (1 / dimension), basis: 'weights' };
  }
  return missing(label, 'h, the number of cells, or the cells per direction');
}

function firstNotPositive(grid: KnownSpacing): [string, number] | undefined {
  const stated: [string, number | undefined][] = [
    ['h', grid.h], ['cells', grid.cells], ['cells per direction', grid.cellsPerDirection],
    ['sum of weights', grid.weightSum], ['rows', grid.rows], ['time step', grid.dt],
  ];
  for (const [name, value] of stated) {
    if (value !== undefined && !(value > 0 && Number.isFinite(value))) return [name, value];
  }
  return undefined;
}

function missing(label: string, expected: string): SpacingProblem {
  return { code: 'spacing-missing', label, found: 'nothing that tells the spacing', expected };
}

function dimensionMissing(label: string): SpacingProblem {
  return { code: 'dimension-missing', label, found: 'a count of cells without a dimension', expected: 'the dimension, 1, 2 or 3' };
}
