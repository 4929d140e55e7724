import { describe, expect, it } from 'vitest';
import { assessQuickCheck } from '@/lib/domain/assessment/quick-check';
import { quickCheckSchema, type QuickCheckInput } from '@/lib/domain/assessment/quick-schema';

type Raw = Record<string, unknown>;
const read = (input: Raw): QuickCheckInput => quickCheckSchema.parse(input);
const assess = (input: Raw) => {
  const result = assessQuickCheck(read(input));
  if (!result.ok) throw new Error(JSON.stringify(result.faults));
  return result.assessment;
};
const faults = (input: Raw) => {
  const result = assessQuickCheck(read(input));
  return result.ok ? [] : result.faults.map((fault) => fault.path);
};

const halvings = [1, 2, 4, 8].map((n) => ({ cellsPerDirection: n * 8, errors: { L2: 1 / n ** 2, Linf: 3 / n ** 2 } }));
const values = [1, 2, 4].map((n) => ({ cells: (8 * n) ** 2, value: 100 + 1 / n ** 2 }));

describe('assessQuickCheck', () => {
  it('reads orders of errors for every norm, finest first whatever the order of the request', () => {
    const { fields, outcome } = assess({ dimension: 2, formalOrder: 2, grids: halvings });
    expect(outcome).toBe('pass');
    expect(fields.map((field) => [field.norm, field.outcome])).toEqual([['L2', 'pass'], ['Linf', 'pass']]);
    expect(fields[0]?.grids.map((grid) => grid.label)).toEqual(['4', '3', '2', '1']);
    expect(fields[0]?.orders.map((pair) => pair.order)).toEqual([2, 2, 2]);
  });
  it('reads cells in all as (1/N)^(1/D): the same values are of order 2 in two dimensions, of order 1 in one', () => {
    expect(assess({ dimension: 2, grids: values }).quantities[0]?.orderObserved).toBeCloseTo(2, 9);
    expect(assess({ dimension: 1, grids: values }).quantities[0]?.orderObserved).toBeCloseTo(1, 9);
  });
  it('judges a quantity with a known value by its error', () => {
    const four = [...values, { cells: 64 ** 2, value: 100 + 1 / 64 }];
    expect(assess({ dimension: 2, grids: four, formalOrder: 2, knownValue: 100 })).toMatchObject({ outcome: 'pass', quantities: [], fields: [{ norm: 'value', grids: { length: 4 } }] });
  });
  it('takes three grids for a quantity and asks four of errors, unless told', () => {
    expect(assess({ dimension: 2, grids: values, formalOrder: 2, target: 1 }).outcome).toBe('meets-target');
    expect(assess({ dimension: 2, grids: halvings.slice(0, 3), formalOrder: 2 }).reasons).toEqual(['too-few-grids']);
    expect(assess({ dimension: 2, grids: halvings.slice(0, 3), formalOrder: 2, minimumGrids: 3 }).outcome).toBe('pass');
  });
  it('takes formal order and tolerance per norm', () => {
    const { fields } = assess({ dimension: 2, grids: halvings, formalOrder: { L2: 2, Linf: 1 }, tolerance: { L2: 0.05 } });
    expect(fields.map((field) => [field.formalOrder, field.tolerance, field.outcome])).toEqual([[2, 0.05, 'pass'], [1, 0.2, 'inconclusive']]);
  });
  it.each([
    [{ grids: [{ h: 1, value: 1 }, { h: 0.5, errors: { L2: 1 } }] }, 'grids.1.value'],
    [{ grids: [{ h: 1, errors: { L2: 1 } }, { h: 0.5, errors: { Linf: 1 } }] }, 'grids.0.errors.Linf'],
    [{ grids: [{ h: 1 }, { h: 0.5 }] }, 'grids'],
    [{ grids: [{ value: 1 }, { value: 2 }] }, 'grids.0'],
    [{ grids: [{ h: 1, value: 1 }, { h: 1, value: 2 }] }, 'grids.1'],
    [{ grids: [{ label: 'a', h: 1, value: 1 }, { label: 'a', h: 0.5, value: 2 }] }, 'grids.1.label'],
    [{ grids: [{ h: 1, value: 1 }, { h: 0.5, value: 2 }], expectExact: true }, 'expectExact'],
    [{ grids: [{ h: 1, value: 1 }, { h: 0.5, value: 2 }], formalOrder: { L2: 2 } }, 'formalOrder'],
    [{ grids: [{ h: 1, errors: { L2: 1 } }, { h: 0.5, errors: { L2: 2 } }], target: 0.1 }, 'target'],
    [{ grids: [{ h: 1, errors: { L2: 1 } }, { h: 0.5, errors: { L2: 2 } }], formalOrder: { L1: 2 } }, 'formalOrder.L1'],
    [{ grids: [{ h: 1, errors: { L2: 1 }, iterativeError: { L1: 1e-3 } }, { h: 0.5, errors: { L2: 2 } }] }, 'grids.0.iterativeError.L1'],
    [{ dimension: 3, grids: [{ cellsPerDirection: [1, 2], value: 1 }, { h: 0.5, value: 2 }] }, 'grids.0.cellsPerDirection'],
  ])('names the member that is wrong in %j', (input, path) => expect(faults(input)).toContain(path));
});
