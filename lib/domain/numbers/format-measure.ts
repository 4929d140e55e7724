import { formatError } from './format-error';
import { printDecimal } from './signs';

/** Within these a plain decimal is shorter than a power of ten. */
const plain = { from: 1e-2, below: 1e4 } as const;

/** An uncertainty or difference in a quantity's unit, with two digits: 8.9, 0.094, 9.4 × 10⁻⁴. The unit follows where there is one. */
export function formatMeasure(value: number, unit: string | null = null, digits = 2): string {
  const size = Math.abs(value);
  const exponent = Number(value.toExponential(digits - 1).split('e')[1]);
  const printed = value !== 0 && size >= plain.from && size < plain.below
    ? printDecimal(Number(value.toPrecision(digits)).toFixed(Math.max(digits - 1 - exponent, 0)))
    : formatError(value, digits).text;
  return unit ? `${printed} ${unit}` : printed;
}
