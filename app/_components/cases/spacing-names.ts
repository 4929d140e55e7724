import type { SpacingAs } from './case-values';

/** The ways to state a spacing. */
export const spacingNames: Record<SpacingAs, string> = { cellsPerDirection: 'Cells per direction', cells: 'Cells in all', h: 'Spacing h' };
