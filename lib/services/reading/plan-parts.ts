import type { CaseDefinition } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { domainVolume } from '@/lib/domain/problems/domain-volume';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';
import { statedSpacing } from '@/lib/domain/studies/stated-spacing';
import type { Bands, Interval } from '@/lib/numerics/regions/bands';
import { gridSpacing } from '@/lib/numerics/spacing/grid-spacing';
import type { GridReading } from '@/lib/readers/grid-reading';
import type { GridDefinition } from '../studies/grid-definition';

export interface PartsAsked {
  definition: CaseDefinition;
  problem: ProblemDefinition;
  mapping: ColumnMapping;
  /** What the author of the grid stated. */
  grid: GridDefinition;
  /** The dimension of the study, which may see a mesh one cell thick as flat. */
  seenAs: number;
}

const axes = ['x', 'y', 'z'] as const;

/** The bands along the boundary that norms are made of, and the maps of fields that are compared. */
export function planParts(asked: PartsAsked): Pick<GridReading, 'bands' | 'maps'> {
  const { dimension } = asked.problem;
  const bands = planBands(asked);
  return { ...(bands && { bands }), maps: { fields: [], dimension, box: boxOf(asked.problem), h: dimension === asked.seenAs ? knownSpacing(asked) : null } };
}

/** Maps of these fields, of those that the reading has; none where there are none. */
export function mapFields(reading: GridReading, fields: readonly string[]): GridReading {
  const read = reading.fields.flatMap(({ field }) => (fields.includes(field) ? [field] : []));
  return { ...reading, maps: reading.maps && read.length > 0 ? { ...reading.maps, fields: read } : undefined };
}

/**
 * Of two spacings by the distance from the boundary, where the grid states its spacing or else every row its own size; of
 * the case's thickness, or of the rows that a column flags. Distances are those of a column, or from the box of the problem.
 */
function planBands(asked: PartsAsked): Bands | undefined {
  const { definition, problem, mapping, seenAs } = asked;
  // Seen in another dimension, every row of a mesh one cell thick would lie at the boundary.
  const distance = mapping.distance === undefined ? (problem.dimension === seenAs ? boxOf(problem) : null) : 'column';
  const bands: Bands['bands'][number][] = [];
  const h = knownSpacing(asked);
  if (distance !== null && h !== null) bands.push({ name: '2h', test: { by: 'thickness', thickness: 2 * h } });
  else if (distance !== null && mapping.weight !== null) bands.push({ name: '2h', test: { by: 'weight', dimension: seenAs } });
  const thickness = definition.boundaryBand?.thickness;
  if (mapping.flag !== undefined) bands.push({ name: 'fixed', test: { by: 'flag' } });
  else if (distance !== null && thickness !== undefined) bands.push({ name: 'fixed', test: { by: 'thickness', thickness } });
  return bands.length === 0 ? undefined : { distance: bands.every(({ test }) => test.by === 'flag') ? null : distance, bands };
}

function boxOf({ domain = {}, dimension }: ProblemDefinition): Interval[] | null {
  const sides = axes.slice(0, dimension).flatMap((axis) => (domain[axis] ? [domain[axis]] : []));
  return sides.length === dimension ? sides : null;
}

/** A length: counts of cells tell one only together with the box. */
function knownSpacing({ problem, grid, seenAs }: PartsAsked): number | null {
  const volume = domainVolume(problem, seenAs);
  const { label, h, cells, cellsPerDirection } = statedSpacing({ label: '', h: grid.h, cells: grid.cells, cellsPerDirection: grid.cellsPerDirection });
  const stated = { label, h: h ?? undefined, cells: cells ?? undefined, cellsPerDirection: cellsPerDirection ?? undefined };
  const found = gridSpacing(stated, { refinement: 'space', dimension: seenAs, volume });
  return 'code' in found || (found.basis !== 'h' && volume === null) ? null : found.h;
}
