import type { ProblemDefinition } from './schema';

/** Length, area or volume of the problem's box; null where it has none, or is looked at in another dimension. */
export function domainVolume({ dimension, domain }: Pick<ProblemDefinition, 'dimension' | 'domain'>, seenAs: number): number | null {
  if (seenAs !== dimension) return null;
  const sides = (['x', 'y', 'z'] as const).slice(0, dimension).map((axis) => domain?.[axis]);
  return sides.reduce<number | null>((volume, side) => (volume === null || side === undefined ? null : volume * (side[1] - side[0])), 1);
}
