import { describe, expect, it } from 'vitest';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { pairwiseOrder } from '@/lib/numerics/order/pairwise-order';
import { errorSeries } from '../support/series';
import { readReference } from './reference';

interface Case { source: string; field: string; n: number[]; errors: number[]; orders: number[]; formalOrder: number }

// Error norms as published have four significant digits, so an order follows to 0.01.
const withinPrinted = 0.01;
const { cases } = readReference<{ cases: Case[] }>('orders.json');

describe('observed orders of published error norms', () => {
  it.each(cases)('$source, $field', ({ n, errors, orders }) => {
    orders.forEach((published, i) => {
      const at = (index: number) => ({ h: 1 / (n[index] ?? 0), error: errors[index] ?? 0, knownError: 0 });
      const { order } = pairwiseOrder(at(i), at(i + 1));
      expect(Math.abs((order ?? 0) - published), `pair ${n[i]} to ${n[i + 1]}: ${order} against ${published}`).toBeLessThan(withinPrinted);
    });
  });

  it.each(cases)('$source, $field: the finest pair is the one published last', ({ n, errors, orders, formalOrder }) => {
    const judged = judgeErrorSeries(errorSeries(n.map((count) => 1 / count), errors, { formalOrder }));
    expect(judged.orders[0]?.order).toBeCloseTo(orders.at(-1) ?? 0, 1);
    expect(judged.orders).toHaveLength(orders.length);
  });
});
