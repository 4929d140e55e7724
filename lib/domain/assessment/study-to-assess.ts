import type { ErrorSeries, QuantitySeries, SpaceTimeSeries } from '@/lib/numerics/assessment';
import type { Similarity } from '@/lib/numerics/mesh/judge-similarity';
import type { FieldNorms, GridNorms } from '@/lib/numerics/norms/grid-norms';
import type { Surroundings } from '@/lib/numerics/patterns/suggest-patterns';
import type { CaseDefinition } from '../cases/definition';
import type { GridInput } from '../studies/input';

/** The norms of what the solution of one grid differs by from that of the next coarser one. */
export interface GridDifference { fine: string; coarse: string; fields: FieldNorms[] }

/** A grid as it takes part in the assessment: what its author stated and, where it has a file, the norms read from it. */
export interface StudyGrid { grid: GridInput; norms: GridNorms | null }
export type PlacedGrid = StudyGrid & { h: number };

export interface StudyToAssess {
  definition: CaseDefinition;
  grids: readonly StudyGrid[];
  refinement: 'space' | 'time';
  dimension: number;
  /** Of the domain's box, null where unknown. */
  volume: number | null;
  box?: Surroundings['box'];
  /** Of solutions without an exact one, finest first. */
  differences?: readonly GridDifference[];
}

export type StudySeries = { ok: true; errors: ErrorSeries[]; quantities: QuantitySeries[]; spaceTime?: SpaceTimeSeries[]; similarity?: Similarity | null; around?: Surroundings } | { ok: false; reason: string };
