import { formatError } from './format-error';
import { printDecimal, thinSpace } from './signs';

/** A fraction in percent with two significant digits: 0.0015 as "0.15 %". */
export function formatPercent(fraction: number): string {
  const percent = fraction * 100;
  const size = Math.abs(percent);
  const printed = size !== 0 && (size < 1e-4 || size >= 1e6) ? formatError(percent, 2).text
    : printDecimal(size >= 10 ? String(Number(percent.toPrecision(2))) : percent === 0 ? '0' : percent.toPrecision(2));
  return `${printed}${thinSpace}%`;
}
