import type { SpacingNote, KnownSpacing } from './spacing-types';

/** Sums of weights over one domain may differ by the digits they are stored with, not more. */
const weightsAgreeWithin = 1e-6;

/**
 * Notes on a series refined in space: rows that are not the cells stated (nodes, or a part of the domain missing), sums of
 * weights that differ from the first grid's by more than 1e-6 of it (grids that do not cover the same domain), and a first
 * sum that differs so from the volume of the domain, where that is known.
 */
export function noteSpacing(grids: readonly KnownSpacing[], volume: number | null = null): SpacingNote[] {
  const notes: SpacingNote[] = [];
  const first = grids.find((grid) => grid.weightSum !== undefined);
  for (const { label, cells, rows, weightSum } of grids) {
    if (cells !== undefined && rows !== undefined && cells !== rows) {
      notes.push({ code: 'rows-differ-from-cells', label, found: rows, expected: cells });
    }
    if (first?.weightSum !== undefined && weightSum !== undefined && differs(weightSum, first.weightSum)) {
      notes.push({ code: 'weights-differ', label, found: weightSum, expected: first.weightSum });
    }
  }
  if (first?.weightSum !== undefined && volume !== null && differs(first.weightSum, volume)) {
    notes.push({ code: 'weights-differ-from-volume', label: first.label, found: first.weightSum, expected: volume });
  }
  return notes;
}

function differs(found: number, expected: number): boolean {
  return Math.abs(found - expected) > weightsAgreeWithin * Math.abs(expected);
}
