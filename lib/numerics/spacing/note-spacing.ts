import type { SpacingNote, KnownSpacing } from './spacing-types';

/** Sums of weights over one domain may differ by the digits they are stored with, not more. */
const weightsAgreeWithin = 1e-6;

/**
 * Notes on a series refined in space: rows that are not the cells stated (nodes, or a part of the domain missing), and
 * sums of weights that differ from the first grid's by more than 1e-6 of it (grids that do not cover the same domain).
 */
export function noteSpacing(grids: readonly KnownSpacing[]): SpacingNote[] {
  const notes: SpacingNote[] = [];
  const first = grids.find((grid) => grid.weightSum !== undefined)?.weightSum;
  for (const { label, cells, rows, weightSum } of grids) {
    if (cells !== undefined && rows !== undefined && cells !== rows) {
      notes.push({ code: 'rows-differ-from-cells', label, found: rows, expected: cells });
    }
    if (first !== undefined && weightSum !== undefined && Math.abs(weightSum - first) > weightsAgreeWithin * Math.abs(first)) {
      notes.push({ code: 'weights-differ', label, found: weightSum, expected: first });
    }
  }
  return notes;
}
