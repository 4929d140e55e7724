import type { FieldNorms } from '@/lib/numerics/norms/grid-norms';
import { chainGrids } from '@/lib/numerics/spacing/chain-grids';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';
import { statedSpacing } from '../studies/stated-spacing';
import type { StudyToAssess } from './study-series';

/** The norms of what the solution of one grid differs by from that of the next coarser one. */
export interface GridDifference { fine: string; coarse: string; fields: FieldNorms[] }

/**
 * Grids whose solutions are compared, each with the next coarser one at a ratio of 1.3 or more, finest first; none where
 * the grids cannot be put in a row, which the assessment then says.
 */
export function comparedGrids({ grids, refinement, dimension, volume }: Omit<StudyToAssess, 'definition' | 'differences'>): { fine: string; coarse: string }[] {
  const withSolutions = grids.filter(({ norms }) => norms?.solutions !== undefined);
  const spacing = resolveSpacing({ grids: withSolutions.map(({ grid, norms }) => statedSpacing(grid, norms)), refinement, dimension, volume });
  if (!spacing.ok) return [];
  const chain = chainGrids(spacing.grids.map(({ h }) => h)).flatMap((index) => spacing.grids[index] ?? []);
  return chain.slice(1).flatMap((coarse, index) => (chain[index] ? [{ fine: chain[index].label, coarse: coarse.label }] : []));
}
