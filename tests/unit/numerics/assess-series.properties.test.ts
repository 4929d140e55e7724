import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assessSeries } from '@/lib/numerics/assess-series';
import type { SeriesAssessment } from '@/lib/numerics/assessment';
import { errorSeries, quantitySeries } from '../../support/series';

/** A series with ratios between 1.2 and 3 and errors of any size, coarse to fine. */
const anySeries = fc.array(fc.record({ ratio: fc.double({ min: 1.2, max: 3, noNaN: true }), error: fc.double({ min: 1e-3, max: 1e3, noNaN: true }) }), { minLength: 3, maxLength: 8 })
  .map((steps) => {
    let spacing = 1;
    return steps.map(({ ratio, error }) => ({ h: (spacing /= ratio), error }));
  });
const anyOrder = fc.double({ min: 0.5, max: 6, noNaN: true });
/** A power of two scales a double without rounding. */
const anyPower = fc.integer({ min: -30, max: 30 }).map((exponent) => 2 ** exponent);

function assess(grids: readonly { h: number; error: number }[], formalOrder: number, scale = 0): SeriesAssessment {
  const errors = [errorSeries(grids.map((grid) => grid.h), grids.map((grid) => grid.error), { formalOrder, scale })];
  return assessSeries({ errors, quantities: [] });
}

const judged = ({ fields }: SeriesAssessment) => fields.map(({ outcome, reasons, orders }) => ({ outcome, reasons, orders: orders.map((pair) => pair.order) }));

describe('assessSeries', () => {
  it('changes no order and no outcome when every h is scaled', () => {
    fc.assert(fc.property(anySeries, anyOrder, anyPower, (grids, order, factor) => {
      expect(judged(assess(grids.map(({ h, error }) => ({ h: h * factor, error })), order))).toEqual(judged(assess(grids, order)));
    }));
  });

  it('changes no order and no outcome when every error and the scale of the field are scaled', () => {
    fc.assert(fc.property(anySeries, anyOrder, anyPower, (grids, order, factor) => {
      expect(judged(assess(grids.map(({ h, error }) => ({ h, error: error * factor })), order, factor))).toEqual(judged(assess(grids, order, 1)));
    }));
  });

  it('changes nothing when the grids come in another order', () => {
    const shuffled = anySeries.chain((grids) => fc.tuple(fc.constant(grids), fc.shuffledSubarray(grids.map((_, i) => i), { minLength: grids.length })));
    fc.assert(fc.property(shuffled, anyOrder, ([grids, places], order) => {
      const series = errorSeries(grids.map((grid) => grid.h), grids.map((grid) => grid.error), { formalOrder: order });
      const mixed = { ...series, grids: places.flatMap((place) => series.grids[place] ?? []) };
      expect(assessSeries({ errors: [mixed], quantities: [] })).toEqual(assessSeries({ errors: [series], quantities: [] }));
    }));
  });

  it('passes C·h^p against p and fails it against p + 1 on five grids', () => {
    const exponents = fc.double({ min: -20, max: 20, noNaN: true });
    fc.assert(fc.property(anyOrder, fc.double({ min: 1.4, max: 3, noNaN: true }), exponents, (order, ratio, exponent) => {
      const grids = Array.from({ length: 5 }, (_, i) => ({ h: ratio ** -i, error: 2 ** exponent * ratio ** (-i * order) }));
      expect(assess(grids, order, 2 ** -200)).toMatchObject({ outcome: 'pass', reasons: ['in-band'] });
      expect(assess(grids, order + 1, 2 ** -200)).toMatchObject({ outcome: 'fail', reasons: ['below-formal'] });
    }));
  });

  it('recovers value and order of φ0 + αh^p on any ratios', () => {
    const ratio = fc.double({ min: 1.4, max: 3, noNaN: true });
    fc.assert(fc.property(fc.double({ min: 0.5, max: 4, noNaN: true }), ratio, ratio, fc.double({ min: 0.05, max: 0.5, noNaN: true }), (order, r21, r32, alpha) => {
      const h = [1, r21, r21 * r32];
      const [found] = assessSeries({ errors: [], quantities: [quantitySeries(h, h.map((spacing) => 10 + alpha * spacing ** order))] }).quantities;
      expect(found?.orderObserved).toBeCloseTo(order, 6);
      expect(found?.extrapolated).toBeCloseTo(10, 6);
      expect(found?.convergence).toBe('monotone');
    }));
  });

  it('gives no GCI a value that is not finite, whatever the values', () => {
    const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 2, maxLength: 6 });
    fc.assert(fc.property(values, (list) => {
      const h = list.map((_, i) => 1.5 ** i);
      const [found] = assessSeries({ errors: [], quantities: [quantitySeries(h, list, { formalOrder: 2, target: 0.01 })] }).quantities;
      const figures = [found?.gci, found?.gciAbsolute, found?.gciCoarse, found?.extrapolated, found?.extrapolatedError, found?.relativeChange, found?.asymptoticRatio, found?.halfRange, found?.formulaValue, ...(found?.orderRange ?? [])];
      for (const figure of figures) expect(figure === null || Number.isFinite(figure)).toBe(true);
    }));
  });
});
