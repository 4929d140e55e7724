/** |difference/of|, as a fraction; null where `of` is 0, or so small that the fraction is beyond a number. */
export function relativeSize(difference: number, of: number): number | null {
  const fraction = Math.abs(difference / of);
  return Number.isFinite(fraction) ? fraction : null;
}
