import { printDecimal } from './signs';

/** So near a limit of the band two decimals would not tell on which side an order lies. */
const nearLimit = 0.01;

/** An observed order with two decimals, three within 0.01 of one of the limits it is judged by. */
export function formatOrder(order: number, limits: readonly number[] = []): string {
  const isNear = limits.some((limit) => Math.abs(order - limit) <= nearLimit * (1 + 1e-9));
  const text = order.toFixed(isNear ? 3 : 2);
  return printDecimal(Number(text) === 0 ? text.replace('-', '') : text);
}
