import { describe, expect, it } from 'vitest';
import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { assessSeries } from '@/lib/numerics/assess-series';
import { quantitySeries } from '../support/series';
import { readReference } from './reference';

type Percentages = Partial<Record<'order' | 'extrapolated' | 'relativeChangePct' | 'extrapolatedErrorPct' | 'gciPct' | 'gciPctWithoutLimiter', number | string>>;
interface Row { n: number[]; phi: number[]; dimension: number; type: string; recomputed: Percentages }
interface Reference {
  celik2008: { cases: (Row & { published: Percentages })[] };
  nparc: { r: number; phi: number[]; recomputed: { order: number; extrapolated: number; gci21Pct: number; gci32Pct: number; asymptoticRatio: number } };
  nasa: { rows: (Row & { quantity: string; set: string; limiter: string })[] };
}

const { celik2008, nparc, nasa } = readReference<Reference>('gci.json');

function assess(h: number[], phi: number[]): QuantityAssessment {
  const [quantity] = assessSeries({ errors: [], quantities: [quantitySeries(h, phi)] }).quantities;
  if (!quantity) throw new Error('no quantity assessed');
  return quantity;
}

const spacings = ({ n, dimension }: Row) => n.map((cells) => cells ** (-1 / dimension));
const relative = (found: number | null, expected: number | string | undefined) => Math.abs((found ?? Number.NaN) / Number(expected) - 1);

describe('Celik, Ghia, Roache, Freitas et al., J. Fluids Eng. 130 (2008) 078001, table 1', () => {
  it.each(celik2008.cases.slice(0, 2))('column of $phi', (row) => {
    const found = assess(spacings(row), row.phi);
    expect(found.convergence).toBe(row.type);
    expect(found.orderObserved).toBeCloseTo(Number(row.recomputed.order), 6);
    expect(found.orderObserved?.toFixed(2)).toBe(Number(row.published.order).toFixed(2));
    expect(relative(found.extrapolated, row.recomputed.extrapolated)).toBeLessThan(1e-8);
    expect(relative(found.relativeChange, Number(row.recomputed.relativeChangePct) / 100)).toBeLessThan(1e-7);
    expect(relative(found.extrapolatedError, Number(row.recomputed.extrapolatedErrorPct) / 100)).toBeLessThan(1e-7);
    expect(relative(found.gci, Number(row.recomputed.gciPct) / 100)).toBeLessThan(1e-7);
  });

  it('third column oscillates: its order is the value of the formula only, with no extrapolation and no GCI', () => {
    const row = celik2008.cases[2];
    if (!row) throw new Error('third column missing');
    const found = assess(spacings(row), row.phi);
    expect(found).toMatchObject({ convergence: 'oscillatory', orderObserved: null, extrapolated: null, gci: null, branch: 'none' });
    expect(found.formulaValue).toBeCloseTo(Number(row.recomputed.order), 6);
    expect(found.halfRange).toBeCloseTo((6.0909 - 5.9624) / 2, 12);
  });
});

// NPARC Alliance, Examining Spatial (Grid) Convergence, supersonic diffuser pressure recovery.
it('NPARC example: order, extrapolated value, both GCIs and their ratio', () => {
  const found = assess([1, nparc.r, nparc.r ** 2], nparc.phi);
  expect(found.convergence).toBe('monotone');
  expect(found.orderObserved).toBeCloseTo(nparc.recomputed.order, 9);
  expect(relative(found.extrapolated, nparc.recomputed.extrapolated)).toBeLessThan(1e-11);
  expect(relative(found.gci, nparc.recomputed.gci21Pct / 100)).toBeLessThan(1e-9);
  expect(relative(found.gciCoarse, nparc.recomputed.gci32Pct / 100)).toBeLessThan(1e-9);
  expect(found.asymptoticRatio).toBeCloseTo(nparc.recomputed.asymptoticRatio, 8);
});

// NASA Langley Research Center, Turbulence Modeling Resource; its limiter on GCI is not part of the procedure.
describe('NASA Turbulence Modeling Resource', () => {
  it('holds all 249 rows', () => expect(nasa.rows).toHaveLength(249));
  it.each(nasa.rows.map((row, index) => ({ ...row, index })))('row $index: $quantity of $set is $type', (row) => {
    const found = assess(spacings(row), row.phi);
    expect(found.convergence).toBe(row.type);
    if (row.recomputed.order === undefined) expect(found.orderObserved).toBeNull();
    else expect(Math.abs((found.orderObserved ?? Number.NaN) - Number(row.recomputed.order))).toBeLessThan(1e-6);
    if (row.recomputed.gciPctWithoutLimiter === undefined) expect(found.gci).toBeNull();
    else {
      expect(relative(found.gci, Number(row.recomputed.gciPctWithoutLimiter) / 100)).toBeLessThan(1e-5);
      expect(relative(found.extrapolated, row.recomputed.extrapolated)).toBeLessThan(1e-5);
      expect(relative(found.relativeChange, Number(row.recomputed.relativeChangePct) / 100)).toBeLessThan(1e-5);
      expect(relative(found.extrapolatedError, Number(row.recomputed.extrapolatedErrorPct) / 100)).toBeLessThan(1e-5);
    }
  });
});
