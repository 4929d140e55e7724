import { describe, expect, it } from 'vitest';
import { errorPanel } from '@/lib/figures/error-figure/error-panel';
import { figureFields } from '@/lib/figures/error-figure/figure-fields';
import { formalLine } from '@/lib/figures/error-figure/formal-line';
import { errorFigureLayout } from '@/lib/figures/error-figure/layout';
import { orderBands } from '@/lib/figures/error-figure/order-bands';
import { orderPanel, orderTicks } from '@/lib/figures/error-figure/order-panel';
import { pairPoints } from '@/lib/figures/error-figure/pair-points';
import { errorFigureScales } from '@/lib/figures/error-figure/scales';
import { slopeTriangle } from '@/lib/figures/error-figure/slope-triangle';
import type { FieldAssessment } from '@/lib/numerics/assessment';
import { fieldAssessment } from './field-assessment';

const secondOrder = [1e-4, 4e-4, 1.6e-3, 6.4e-3];

function drawn(assessments: FieldAssessment[], width = 840) {
  const fields = figureFields(assessments);
  const scales = errorFigureScales(fields);
  const field = fields[0];
  if (!scales || !field) throw new Error('nothing to draw');
  const layout = errorFigureLayout(width, fields.length, scales.ratio);
  const place = { layout, scales, isFirst: true };
  return { fields, field, scales, layout, errors: errorPanel(field, place), orders: orderPanel(field, place) };
}

describe('errorFigureScales(fields)', () => {
  it.each([1, 1.5, 2])('lets formal order %d rise at 45°', (formal) => {
    const errors = [0, 1, 2, 3].map((step) => 1e-4 * 2 ** (formal * step));
    const { scales, layout } = drawn([fieldAssessment({ errors, formal })]);
    const perSpacing = layout.panelWidth / (scales.spacing.to - scales.spacing.from);
    const perError = layout.errorHeight / (scales.error.to - scales.error.from);
    expect(scales.orderAt45).toBe(formal);
    expect(perError).toBeCloseTo(perSpacing / formal, 0);
  });

  it('clamps a panel that would be too flat, and then promises no 45°', () => {
    const { scales } = drawn([fieldAssessment({ errors: [1e-3, 1.01e-3, 1.02e-3, 1.03e-3], formal: 4 })]);
    expect(scales.ratio).toBe(0.6);
    expect(scales.orderAt45).toBeNull();
  });

  it('leaves room for labels: 0.13 decade before the finest grid, 0.235 after the coarsest', () => {
    const { scales } = drawn([fieldAssessment({ errors: secondOrder })]);
    expect(scales.spacing.from).toBeCloseTo(Math.log10(1 / 64) - 0.13, 12);
    expect(scales.spacing.to).toBeCloseTo(Math.log10(1 / 8) + 0.235, 12);
  });

  it('shows orders from pf − 1.1 to pf + 0.6, wider where the data are', () => {
    expect(drawn([fieldAssessment({ errors: secondOrder })]).scales.order).toEqual({ from: expect.closeTo(0.9, 9) as number, to: expect.closeTo(2.6, 9) as number });
    expect(drawn([fieldAssessment({ errors: [1e-4, 1e-4, 1.6e-3, 6.4e-3] })]).scales.order.from).toBeLessThan(0);
  });

  it('is null where no error is above zero', () => {
    expect(errorFigureScales(figureFields([fieldAssessment({ errors: [0, 0] })]))).toBeNull();
  });
});

describe('formalLine(series)', () => {
  it('passes through the finest point that is used', () => {
    const line = formalLine(fieldAssessment({ errors: [3e-16, 4e-4, 1.6e-3, 6.4e-3], unused: [0] }));
    expect(line?.at(Math.log10(1 / 32))).toBeCloseTo(Math.log10(4e-4), 12);
    expect(line?.at(Math.log10(1 / 16))).toBeCloseTo(Math.log10(1.6e-3), 12);
  });

  it('is null without a formal order', () => {
    expect(formalLine(fieldAssessment({ errors: secondOrder, formal: null }))).toBeNull();
  });
});

describe('slopeTriangle(field)', () => {
  it('stands on one halving between the third and second coarsest grid, 0.42 decade below the lowest formal line', () => {
    const { field } = drawn([fieldAssessment({ errors: secondOrder }), fieldAssessment({ errors: secondOrder.map((e) => 3 * e), norm: 'Linf' })]);
    const triangle = slopeTriangle(field);
    expect(triangle?.from).toBeCloseTo(Math.log10(1 / 32), 12);
    expect(triangle?.to).toBeCloseTo(Math.log10(1 / 16), 12);
    expect(triangle?.base).toBeCloseTo(Math.log10(4e-4) - 0.42, 12);
    expect(triangle?.slopes).toEqual([{ order: 2, top: expect.closeTo(Math.log10(4e-4) - 0.42 + 2 * Math.log10(2), 12) as number }]);
  });

  it('shows one slope per formal order', () => {
    const { field } = drawn([fieldAssessment({ errors: secondOrder }), fieldAssessment({ errors: secondOrder, norm: 'Linf', formal: 1 })]);
    expect(slopeTriangle(field)?.slopes.map(({ order }) => order)).toEqual([1, 2]);
  });
});

describe('orderBands(field)', () => {
  it('are [pf − tolerance, pf + 2 tolerance], wide first, norms with the same band together', () => {
    const { field } = drawn([
      fieldAssessment({ errors: secondOrder, norm: 'L1' }), fieldAssessment({ errors: secondOrder }),
      fieldAssessment({ errors: secondOrder, norm: 'Linf', tolerance: 0.2 }),
    ]);
    const [wide, narrow] = orderBands(field);
    expect(wide).toMatchObject({ norms: ['Linf'], ink: 'band2', low: expect.closeTo(1.8, 9) as number, high: expect.closeTo(2.4, 9) as number });
    expect(narrow).toMatchObject({ norms: ['L1', 'L2'], ink: 'band', low: expect.closeTo(1.9, 9) as number, high: expect.closeTo(2.2, 9) as number });
  });
});

describe('pairPoints(series)', () => {
  it('stand at the geometric mean of the two spacings', () => {
    const [finest] = pairPoints(fieldAssessment({ errors: secondOrder }));
    expect(finest?.h).toBeCloseTo(1 / Math.sqrt(64 * 32), 14);
    expect(finest?.order).toBeCloseTo(2, 12);
  });

  it('leave out pairs without an order', () => {
    expect(pairPoints(fieldAssessment({ errors: [0, 4e-4, 1.6e-3] }))).toHaveLength(1);
  });
});

describe('orderTicks(from, to)', () => {
  it('are at halves, and at whole orders where the panel spans more', () => {
    expect(orderTicks(0.9, 2.6)).toEqual([1, 1.5, 2, 2.5]);
    expect(orderTicks(-1.2, 2.6)).toEqual([-1, 0, 1, 2]);
  });
});

describe('errorFigureLayout(width, fields, ratio)', () => {
  it('puts two fields side by side in the main column, with 58 px at the left and 34 px between', () => {
    expect(errorFigureLayout(844, 2, 1.2)).toMatchObject({ columns: 2, panelWidth: 376, errorHeight: 451, height: 46 + 451 + 34 + 148 + 32 });
  });

  it('shows one field on a phone and where there are more than three', () => {
    expect(errorFigureLayout(350, 2, 1.2)).toMatchObject({ isNarrow: true, columns: 1, panelWidth: 300 });
    expect(errorFigureLayout(844, 4, 1.2)).toMatchObject({ isNarrow: false, columns: 1, panelWidth: 520 });
  });
});

describe('errorPanel(field)', () => {
  it('joins the grids that are used and draws the others hollow', () => {
    const { errors } = drawn([fieldAssessment({ errors: secondOrder, unused: [0] })]);
    expect(errors.lines[0]?.values).toEqual([null, 4e-4, 1.6e-3, 6.4e-3]);
    const hollow = errors.over.filter((item) => item.kind === 'path' && item.fill === 'paper');
    expect(hollow).toHaveLength(1);
  });

  it('puts every point of an exact slope of the formal order on its dashed line', () => {
    const { errors, scales } = drawn([fieldAssessment({ errors: secondOrder })]);
    const dashed = errors.under.find((item) => item.kind === 'path' && item.dash);
    const [x1, y1, x2, y2] = (dashed?.kind === 'path' ? dashed.path.match(/-?[\d.]+/g) ?? [] : []).map(Number) as [number, number, number, number];
    expect(scales.orderAt45).toBe(2);
    expect((y1 - y2) / (x2 - x1)).toBeCloseTo(1, 2);
    for (const item of errors.over) {
      if (item.kind !== 'path' || !item.at) continue;
      expect(item.at[1]).toBeCloseTo(y1 + ((item.at[0] - x1) / (x2 - x1)) * (y2 - y1), 6);
    }
  });

  it('leaves errors of zero to the table', () => {
    const { errors } = drawn([fieldAssessment({ errors: [0, 4e-4, 1.6e-3] })]);
    expect(errors.lines[0]?.values[0]).toBeNull();
  });
});

describe('orderPanel(field)', () => {
  it('draws an error bar only where the uncertainty of a pair is above 0.02', () => {
    const series = fieldAssessment({ errors: secondOrder });
    series.orders = series.orders.map((pair, index) => ({ ...pair, uncertainty: index === 0 ? 0.05 : 0.01 }));
    const { orders } = drawn([series]);
    expect(orders.over.filter((item) => item.kind === 'path' && item.stroke === 'ink')).toHaveLength(1);
  });
});
