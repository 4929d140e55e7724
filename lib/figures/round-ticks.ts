/** Round values within [from, to], steps 1, 2 or 5 times a power of ten, at most `most` of them. */
export function roundTicks(from: number, to: number, most: number): { values: number[]; decimals: number } {
  if (!(to > from)) throw new RangeError(`roundTicks needs from below to, got ${from} and ${to}`);
  const raw = (to - from) / most;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = ([1, 2, 5, 10].find((times) => times * power >= raw * (1 - 1e-9)) ?? 10) * power;
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  const values = Array.from({ length: last - first + 1 }, (_, index) => (first + index) * step);
  return { values, decimals: Math.max(0, -Math.floor(Math.log10(step) + 1e-9)) };
}
