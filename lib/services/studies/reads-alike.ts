import type { GridDefinition } from './grid-definition';

/** What a reading takes from the statement of a grid: its time, and how wide averages, bands along the boundary and bins of maps are. */
const taken = ['t', 'h', 'cells', 'cellsPerDirection'] as const;

/** Whether a file comes to the same under two statements of its grid. */
export function readsAlike(one: GridDefinition, other: GridDefinition): boolean {
  return taken.every((member) => JSON.stringify(one[member]) === JSON.stringify(other[member]));
}
