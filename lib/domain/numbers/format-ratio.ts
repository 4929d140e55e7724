import { formatError } from './format-error';
import { printDecimal } from './signs';

/** From here on two decimals are noise. */
const large = 1e6;

/** A ratio with two decimals, such as that of two errors or two spacings; a power of ten from a million on. */
export function formatRatio(ratio: number): string {
  return ratio < large ? printDecimal(ratio.toFixed(2)) : formatError(ratio).text;
}
