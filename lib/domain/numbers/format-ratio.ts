import { printDecimal } from './signs';

/** A ratio with two decimals, such as that of two errors or two spacings. */
export function formatRatio(ratio: number): string {
  return printDecimal(ratio.toFixed(2));
}
