import { printDecimal } from './signs';

/** A whole number with thousands apart: 10 240. */
export function formatCount(count: number): string {
  return printDecimal(String(Math.round(count)));
}
