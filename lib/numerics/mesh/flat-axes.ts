import type { MeshSurvey } from './mesh-part';

/** A direction this much shorter than the longest is one of rounding. */
const thin = 1e-6;

/**
 * Directions, counted from 0, along which all rows lie at one coordinate, within 1e-6 of the longest: the mesh is one cell
 * thick there and is not refined along it. None where all are so.
 */
export function flatAxes({ low, high }: Pick<MeshSurvey, 'low' | 'high'>): number[] {
  const lengths = low.map((from, axis) => (high[axis] ?? from) - from);
  const longest = Math.max(...lengths);
  return longest > 0 ? lengths.flatMap((length, axis) => (length <= thin * longest ? [axis] : [])) : [];
}
