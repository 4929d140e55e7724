import { describe, expect, it } from 'vitest';
import { extrapolationCurve } from '@/lib/figures/value-figure/extrapolation-curve';
import { uncertaintyBars } from '@/lib/figures/value-figure/uncertainty-bars';
import { valuePanel } from '@/lib/figures/value-figure/value-panel';
import type { QuantityAssessment } from '@/lib/numerics/assessment';

const quantity: QuantityAssessment = {
  name: 'wall gradient', unit: null,
  values: [{ label: '1', h: 0.25, value: 1.0625 }, { label: '2', h: 0.5, value: 1.25 }, { label: '3', h: 1, value: 2 }],
  convergence: 'monotone', orderObserved: 2, orderRange: null, formulaValue: 2, orderUsed: 2, extrapolated: 1,
  relativeChange: null, extrapolatedError: null, safetyFactor: 1.25, gci: 0.0735, gciAbsolute: 0.078125, gciCoarse: 0.25,
  asymptoticRatio: null, halfRange: null, procedure: 'three-grid', branch: 'observed', formalOrder: null, target: null, triples: [], outcome: null, reasons: [],
};

describe('extrapolationCurve(quantity)', () => {
  it('passes through the extrapolated value at h = 0 and through values of the order used', () => {
    const curve = extrapolationCurve(quantity);
    expect([0, 0.25, 0.5, 1].map((h) => curve?.(h))).toEqual([1, 1.0625, 1.25, 2]);
  });

  it('is null where nothing was extrapolated', () => {
    expect(extrapolationCurve({ ...quantity, extrapolated: null })).toBeNull();
  });
});

describe('uncertaintyBars(quantity)', () => {
  it('are the index in the unit on the finest grid and on the one before it', () => {
    expect(uncertaintyBars(quantity)).toEqual([{ h: 0.25, value: 1.0625, half: 0.078125 }, { h: 0.5, value: 1.25, half: 0.3125 }]);
  });

  it('are half the range where there is no index', () => {
    const bars = uncertaintyBars({ ...quantity, gci: null, gciAbsolute: null, gciCoarse: null, halfRange: 0.4 });
    expect(bars).toEqual([{ h: 0.25, value: 1.0625, half: 0.4 }]);
  });
});

describe('valuePanel(quantity, width)', () => {
  it('starts at h = 0 and holds every value and bar', () => {
    const panel = valuePanel(quantity, 480);
    expect(panel.x.from).toBe(0);
    expect(panel.y.from).toBeLessThan(1.25 - 0.3125);
    expect(panel.y.to).toBeGreaterThan(2);
  });

  it('draws values that are all the same', () => {
    const same = { ...quantity, extrapolated: null, gciAbsolute: null, gciCoarse: null, values: quantity.values.map((each) => ({ ...each, value: 3 })) };
    expect(valuePanel(same, 480).y.to).toBeGreaterThan(3);
  });
});
