/** A grid's own name on the spacing axis: a unit fraction where it is one, else the spacing with two digits. */
export function spacingLabel(h: number): string {
  if (!(h > 0) || !Number.isFinite(h)) throw new RangeError(`spacingLabel needs h above 0, got ${h}`);
  const cells = Math.round(1 / h);
  if (cells >= 2 && Math.abs(cells * h - 1) < 1e-9) return `1/${cells}`;
  return h >= 1e-4 && h < 1e5 ? String(Number(h.toPrecision(2))) : h.toPrecision(2).replace('e-', 'e−').replace('e+', 'e');
}
