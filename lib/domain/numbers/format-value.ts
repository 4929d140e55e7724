import { formatError } from './format-error';
import { printDecimal } from './signs';

/** Outside these a plain decimal is mostly zeros. */
const plain = { from: 1e-4, below: 1e7 } as const;
const digitsWithoutUncertainty = 6;

/**
 * A quantity's value with as many digits as its uncertainty (in its unit) leaves: `digits` of the uncertainty are shown,
 * so 0.635662 known to 9.4e-4 is 0.6357 with one, and 2e-16 known to 0.2 is 0.0. Without an uncertainty, six significant
 * digits.
 */
export function formatValue(value: number, uncertainty: number | null = null, digits = 2): string {
  if (value === 0 && !uncertainty) return '0';
  const last = uncertainty ? exponentOf(uncertainty) - digits + 1 : exponentOf(value) - digitsWithoutUncertainty + 1;
  const size = Math.abs(value);
  if (uncertainty && size < 10 ** last / 2) return last < 0 && last >= -6 ? (0).toFixed(-last) : '0';
  if (size >= plain.from && size < plain.below) {
    const fixed = value.toFixed(Math.min(Math.max(-last, 0), 15));
    return printDecimal(uncertainty ? fixed : String(Number(fixed)));
  }
  return formatError(value, Math.min(Math.max(exponentOf(value) - last + 1, 1), 16)).text;
}

function exponentOf(value: number): number {
  return Number(value.toExponential().split('e')[1]);
}
