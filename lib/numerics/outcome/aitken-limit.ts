/**
 * Where three successive values x, y, z are heading if their steps shrink by a constant factor:
 * z − (z−y)²/(z−2y+x). A. C. Aitken, Proc. R. Soc. Edinburgh 46 (1926) 289.
 *
 * Returns null where the two steps are equal: nothing shrinks, there is no limit.
 */
export function aitkenLimit(x: number, y: number, z: number): number | null {
  const bend = z - 2 * y + x;
  return bend === 0 ? null : z - (z - y) ** 2 / bend;
}
