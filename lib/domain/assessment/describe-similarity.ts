import type { PairSimilarity, Similarity } from '@/lib/numerics/mesh/judge-similarity';
import { formatRatio } from '../numbers/format-ratio';
import { joinWords } from './series-name';

/** How the cells of pairs of grids shrink where they do not shrink alike: "from n16 to n32 by 2.00 along x and 1.00 along y". */
export function describeDissimilar(pairs: readonly PairSimilarity[]): string {
  return pairs.filter(({ isAlike }) => !isAlike).map(describePair).join('; ');
}

/** A note on grids that are not refined alike; on those that are there is nothing to say. */
export function explainSimilarity(similarity: Similarity | undefined): string[] {
  if (!similarity || similarity.isSimilar) return [];
  return [`The grids are not refined alike: ${describeDissimilar(similarity.pairs)}. A pass is then inconclusive, since orders need one ratio everywhere.`];
}

function describePair({ coarse, fine, low, median, high, directions }: PairSimilarity): string {
  const parts = [
    ...(low !== null && high !== null && median !== null ? [`by ${formatRatio(low)} to ${formatRatio(high)} (5 and 95 % of the domain, median ${formatRatio(median)})`] : []),
    ...(directions && areApart(directions) ? [`by ${joinWords(directions.map((ratio, axis) => `${formatRatio(ratio)} along ${(['x', 'y', 'z'] as const)[axis] ?? ''}`))}`] : []),
  ];
  return `from ${coarse} to ${fine} cells shrink ${parts.join(' and ')}`;
}

function areApart(ratios: readonly number[]): boolean {
  return Math.max(...ratios) > 1.1 * Math.min(...ratios);
}
