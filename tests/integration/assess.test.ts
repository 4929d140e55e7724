import { describe, expect, it } from 'vitest';
import { procedures } from '@/lib/numerics/assessment';
import { assessContract } from '@/lib/domain/assessment/quick-schema';
import { readReference } from '../checks/reference';
import { ok, refused } from '../support/api';

interface Sequence { note: string; h: number[]; errors: number[]; formalOrder: number; outcome: string; reason: string; norm: string; minimumGrids: number; iterativeError?: number[]; expectExact?: boolean }
interface Column { n: number[]; phi: number[]; dimension: number; type: string; recomputed: Record<string, number | string> }
interface Published { source: string; field: string; n: number[]; errors: number[]; orders: number[]; formalOrder: number }

const outcomes = readReference<{ cases: Sequence[] }>('outcomes.json').cases;
const gci = readReference<{ celik2008: { cases: Column[] }; nparc: { r: number; phi: number[]; recomputed: Record<string, number> }; nasa: { rows: Column[] } }>('gci.json');
const orders = readReference<{ cases: Published[] }>('orders.json').cases;

const within = (found: number | null | undefined, expected: unknown, relative: number) => expect(Math.abs((found ?? Number.NaN) / Number(expected) - 1)).toBeLessThan(relative);

async function quantityOf(body: object) {
  const { quantities: [quantity] } = await ok(null, assessContract, { body });
  if (!quantity) throw new Error('No quantity was assessed.');
  return quantity;
}
const tableOf = ({ n, phi, dimension }: Column) => ({ dimension, grids: n.map((cells, index) => ({ cells, value: phi[index] })) });

describe('POST /api/v1/assess', () => {
  // Invented sequences, judged by an independent reference of the rule: one or more for every branch.
  it.each(outcomes)('$note is $outcome, $reason', async (row) => {
    const { h, errors, iterativeError, formalOrder, norm, minimumGrids, expectExact } = row;
    const grids = h.map((spacing, i) => ({
      h: spacing, errors: { [norm]: errors[i] }, ...(iterativeError ? { iterativeError: { [norm]: iterativeError[i] } } : {}),
    }));
    const answer = await ok(null, assessContract, { body: { grids, formalOrder, minimumGrids, expectExact } });
    expect(answer).toMatchObject({ outcome: row.outcome, reasons: [row.reason], fields: [{ norm, outcome: row.outcome }], inputs: [] });
    // A hint says where to look for a fault; where nothing is wrong there is none.
    if (row.outcome === 'pass') expect(answer.patterns).toEqual([]);
  });

  // Celik, Ghia, Roache, Freitas et al., J. Fluids Eng. 130 (2008) 078001, table 1.
  it.each(gci.celik2008.cases)('Celik’s column of $phi', async (row) => {
    const found = await quantityOf(tableOf(row));
    expect(found.convergence).toBe(row.type);
    const order = row.type === 'monotone' ? found.orderObserved : found.formulaValue;
    expect(Math.abs((order ?? Number.NaN) - Number(row.recomputed.order))).toBeLessThan(1e-6);
    if (row.type !== 'monotone') expect(found).toMatchObject({ gci: null, extrapolated: null });
    else within(found.gci, Number(row.recomputed.gciPct) / 100, 1e-5);
  });

  // NPARC Alliance, Examining Spatial (Grid) Convergence, supersonic diffuser pressure recovery.
  it('NPARC example', async () => {
    const { r, phi, recomputed } = gci.nparc;
    const found = await quantityOf({ grids: phi.map((value, index) => ({ h: r ** index, value })) });
    expect(Math.abs((found.orderObserved ?? Number.NaN) - Number(recomputed.order))).toBeLessThan(1e-6);
    within(found.gci, Number(recomputed.gci21Pct) / 100, 1e-5);
    within(found.gciCoarse, Number(recomputed.gci32Pct) / 100, 1e-5);
  });

  it('all 249 rows of the NASA Turbulence Modeling Resource', async () => {
    expect(gci.nasa.rows).toHaveLength(249);
    for (const row of gci.nasa.rows) {
      const found = await quantityOf(tableOf(row));
      expect(found.convergence).toBe(row.type);
      if (row.recomputed.order === undefined) expect(found.orderObserved).toBeNull();
      else expect(Math.abs((found.orderObserved ?? Number.NaN) - Number(row.recomputed.order))).toBeLessThan(1e-6);
      if (row.recomputed.gciPctWithoutLimiter === undefined) expect(found.gci).toBeNull();
      else within(found.gci, Number(row.recomputed.gciPctWithoutLimiter) / 100, 1e-5);
    }
  });

  // Error norms as published have four significant digits, so an order follows to 0.01.
  it.each(orders)('orders of $source, $field', async ({ n, errors, orders: published, formalOrder }) => {
    const grids = n.map((cellsPerDirection, index) => ({ cellsPerDirection, errors: { L2: errors[index] } }));
    const { fields } = await ok(null, assessContract, { body: { grids, formalOrder } });
    const found = (fields[0]?.orders ?? []).map((pair) => pair.order).reverse();
    expect(found).toHaveLength(published.length);
    published.forEach((order, index) => expect(Math.abs((found[index] ?? Number.NaN) - order)).toBeLessThan(0.01));
  });

  it.each([
    ['guarded-order', 'near-formal', { gci: expect.any(Number) as number, uncertainty: null }],
    ['least-squares', 'power', { gci: null, uncertainty: expect.any(Number) as number, fit: { kind: 'power' } }],
    ['correction-factor', 'near-asymptotic', { gci: null, uncertainty: expect.any(Number) as number }],
  ])('takes the procedure %s and tells its branch and constants', async (procedure, branch, rest) => {
    const grids = [1, 2, 4, 8].map((h) => ({ h, value: 10 + 0.1 * h ** 1.95 }));
    const found = await quantityOf({ grids, procedure, formalOrder: 2, uNumFactor: 2 });
    expect(found).toMatchObject({ procedure, branch, ...rest, uNum: expect.any(Number) as number, constants: expect.any(Object) as object });
    expect(await refused(null, assessContract, { body: { grids, procedure: 'guarded-order' } })).toMatchObject({ status: 422, errors: [{ path: 'formalOrder' }] });
  });

  it('answers the same hash to the same table whatever the order of its members, and another to another', async () => {
    const hash = async (body: object) => (await ok(null, assessContract, { body })).inputsSha256;
    const first = await hash({ formalOrder: 2, grids: [{ h: 1, value: 1 }, { h: 0.5, value: 2 }] });
    expect(first).toMatch(/^[0-9a-f]{64}$/);
    expect(await hash({ grids: [{ value: 1, h: 1 }, { value: 2, h: 0.5 }], formalOrder: 2 })).toBe(first);
    expect(await hash({ formalOrder: 2, grids: [{ h: 1, value: 1 }, { h: 0.5, value: 3 }] })).not.toBe(first);
  });

  it.each([
    ['grids.1.value', { grids: [{ h: 1, value: 1 }, { h: 0.5 }] }],
    ['grids.1', { grids: [{ h: 1, value: 1 }, { h: 1, value: 2 }] }],
    ['grids', { grids: [{ h: 1, value: 1 }] }],
    ['grids.0.h', { grids: [{ h: -1, value: 1 }, { h: 1, value: 1 }] }],
  ])('answers 422 naming %s', async (path, body) => {
    expect(await refused(null, assessContract, { body })).toMatchObject({ status: 422, errors: [{ path }] });
  });

  it('judges H1 and energy norms', async () => {
    const grids = [1, 2, 4, 8].map((n) => ({ h: 1 / n, errors: { H1: 0.3 / n, energy: 0.1 / n } }));
    const { fields } = await ok(null, assessContract, { body: { grids, formalOrder: 1 } });
    expect(fields.map(({ norm, outcome }) => [norm, outcome])).toEqual([['H1', 'pass'], ['energy', 'pass']]);
  });
});

describe('POST /api/v1/assess, at its largest', () => {
  it('answers every procedure on fifty grids in far less than a second', async () => {
    const grids = Array.from({ length: 50 }, (_, index) => ({ h: 0.001 * 1.3 ** index, value: 1 + 1e-5 * 1.3 ** index * Math.sin(index) }));
    for (const procedure of procedures) {
      const begun = performance.now();
      await ok(null, assessContract, { body: { grids, formalOrder: 2, target: 0.01, procedure } });
      expect(performance.now() - begun).toBeLessThan(1000);
    }
    expect((await refused(null, assessContract, { body: { grids: [...grids, { h: 1000, value: 1 }] } })).status).toBe(422);
  });
});
