import { chainGrids } from '@/lib/numerics/spacing/chain-grids';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';
import { statedSpacing } from '../studies/stated-spacing';
import { refinedSpace } from './mesh-of-study';
import type { StudyToAssess } from './study-to-assess';

/**
 * Grids whose solutions are compared, each with the next coarser one at a ratio of 1.3 or more, finest first; none where
 * the grids cannot be put in a row, which the assessment then says.
 */
export function comparedGrids({ grids, refinement, ...around }: Omit<StudyToAssess, 'definition' | 'differences'>): { fine: string; coarse: string }[] {
  const withSolutions = grids.filter(({ norms }) => norms?.solutions !== undefined);
  const { thin, ...space } = refinedSpace(withSolutions, around);
  const spacing = resolveSpacing({ grids: withSolutions.map(({ grid, norms }) => statedSpacing(grid, norms, thin)), refinement, ...space });
  if (!spacing.ok) return [];
  const chain = chainGrids(spacing.grids.map(({ h }) => h)).flatMap((index) => spacing.grids[index] ?? []);
  return chain.slice(1).flatMap((coarse, index) => (chain[index] ? [{ fine: chain[index].label, coarse: coarse.label }] : []));
}
