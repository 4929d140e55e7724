/**
 * One unit of the finest decimal seen in the values: 0.001 for 313.456 and 337.54. Half of it is what printing may have
 * cut off each of them. A number carries no trailing zeros, so the series is read as a whole.
 *
 * Throws where a value is not finite. An empty list has the resolution 1.
 */
export function printedResolution(values: readonly number[]): number {
  let decimals = -Infinity;
  for (const value of values) decimals = Math.max(decimals, decimalsOf(value));
  return Number.isFinite(decimals) ? Number(`1e${-Math.max(decimals, 0)}`) : 1;
}

function decimalsOf(value: number): number {
  if (!Number.isFinite(value)) throw new RangeError(`values must be finite, got ${value}`);
  const [mantissa = '', exponent = '0'] = String(value).split('e');
  const fraction = mantissa.split('.')[1] ?? '';
  return fraction.length - Number(exponent);
}
