import { describe, expect, it } from 'vitest';
import { explainOrderSource } from '@/lib/domain/assessment/explain-order-source';
import { explainField } from '@/lib/domain/assessment/reason-text';
import { studySeries } from '@/lib/domain/assessment/study-series';
import { checkCase } from '@/lib/domain/cases/check-case';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { withElementOrders } from '@/lib/domain/cases/element-orders';
import { explainSampling } from '@/lib/domain/cases/explain-sampling';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { assessSeries } from '@/lib/numerics/assess-series';
import { elementOrder } from '@/lib/numerics/outcome/element-order';

const norms = (...names: string[]) => names.map((norm) => ({ norm }));
const caseOf = (changes: object) => caseDefinitionSchema.parse({ elements: { degree: 2 }, fields: [{ field: 'u', norms: norms('L2', 'H1') }], ...changes });

/** A study whose typed errors fall with the orders given, by norm. */
function assess(changes: object, orders: Record<string, number>) {
  const definition = caseOf(changes);
  const grids = [1, 2, 3, 4].map((i) => ({
    grid: { label: `g${i}`, h: 2 ** -i, errors: { u: Object.fromEntries(Object.entries(orders).map(([norm, order]) => [norm, 2 ** (-i * order)])) } }, norms: null,
  }));
  const series = studySeries({ definition, grids, refinement: 'space', dimension: 2, volume: 1 });
  if (!series.ok) throw new Error(series.reason);
  return assessSeries(series).fields;
}

describe('elementOrder(norm, degree)', () => {
  it('is k + 1 for values, k for gradients, 2k for energies', () => {
    expect((['L1', 'L2', 'Linf', 'H1', 'energy', 'value'] as const).map((norm) => elementOrder(norm, 3))).toEqual([4, 4, 4, 3, 3, 6]);
    expect(elementOrder('L2', 1, true)).toBe(1);
    expect(() => elementOrder('L2', 0)).toThrow('degree must be 1 or above, got 0');
  });
});

describe('a case of finite elements', () => {
  it('has the orders of its elements where it states none: of values, derivatives, energies', () => {
    const { fields, quantities } = withElementOrders(caseOf({
      fields: [{ field: 'u', norms: [{ norm: 'L2' }, { norm: 'H1', formalOrder: 1.5 }, { norm: 'Linf', expectExact: true }] }, { field: 'stress', compare: 'E*d(u, x)', norms: norms('L2') }],
      quantities: [{ name: 'energy', energyLike: true }, { name: 'drag' }],
    }));
    expect(fields.map((field) => field.norms.map(({ formalOrder }) => formalOrder))).toEqual([[3, 1.5, undefined], [2]]);
    expect(quantities.map(({ formalOrder }) => formalOrder)).toEqual([4, undefined]);
    const plain = caseOf({ elements: undefined });
    expect(withElementOrders(plain)).toBe(plain);
  });

  it('is checked by them: a tolerance and a regularity need no order beside', () => {
    const problem = problemDefinitionSchema.parse({ equation: 'poisson', dimension: 2, exact: { u: 'x*y' } });
    const definition = caseOf({ fields: [{ field: 'u', norms: [{ norm: 'L2', tolerance: 0.1, regularity: 1.2 }] }] });
    expect(checkCase(definition, problem, 'order')).toEqual([]);
    expect(checkCase({ ...definition, elements: undefined }, problem, 'order')).toHaveLength(2);
  });

  it('passes at quadrature points, and is inconclusive at nodes from order 3 on and for gradients', () => {
    const found = assess({ sampling: 'quadrature' }, { L2: 3, H1: 2 });
    expect(found.map(({ formalOrder, reasons, elements }) => [formalOrder, reasons, elements])).toEqual([[3, ['in-band'], { degree: 2, order: 3 }], [2, ['in-band'], { degree: 2, order: 2 }]]);
    for (const sampling of ['point', undefined]) {
      const atNodes = assess({ sampling }, { L2: 4, H1: 3 });
      expect(atNodes.map(({ outcome, reasons }) => [outcome, reasons])).toEqual([['inconclusive', ['sampling-not-stated']], ['inconclusive', ['sampling-not-stated']]]);
      expect(atNodes[0] && explainField(atNodes[0])).toEqual([{
        sentence: 'Elements of degree 2 are stated and the finest pair shows 4.00, but not that values are at quadrature points: at nodes they fall faster than the solution between them, and degree 2 can show 4 for a true 3.',
        nextStep: 'Write rows at quadrature points, 4 or more along each direction, with weights times Jacobian, or state norms that the solver computed so; and state quadrature points in the case.',
      }]);
    }
    const linear = assess({ elements: { degree: 1 }, fields: [{ field: 'u', norms: norms('L2') }] }, { L2: 2 });
    expect(linear.map(({ reasons }) => reasons)).toEqual([['in-band']]);
  });

  it('is limited by the regularity: min(k + 1, 2λ) in L2, min(k, λ) in H1', () => {
    const found = assess({ sampling: 'quadrature', fields: [{ field: 'u', norms: [{ norm: 'L2', regularity: 0.75 }, { norm: 'H1', regularity: 0.75 }] }] }, { L2: 1.5, H1: 0.75 });
    expect(found.map(({ formalOrder, statedOrder, reasons }) => [formalOrder, statedOrder, reasons])).toEqual([[1.5, 3, ['in-band']], [0.75, 2, ['in-band']]]);
  });

  it('notes an order stated that is not that of its elements', () => {
    const stated = assess({ sampling: 'quadrature', fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder: 2 }, { norm: 'H1' }] }] }, { L2: 2, H1: 2 });
    expect(stated.map(explainOrderSource)).toEqual([['Elements of degree 2 promise order 3 in this norm; the case states 2.'], ['Order 2 is that of elements of degree 2 in this norm.']]);
  });
});

describe('explainSampling(definition)', () => {
  const notes = (changes: object, formalOrder = 4) => explainSampling(caseOf({ elements: undefined, fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder }] }], ...changes }));
  it('says what follows where averages and point values meet, from order 3 on', () => {
    expect(notes({ sampling: 'average', sourceSampling: 'point' })[1]).toContain('order 2 shows whatever the scheme');
    expect(notes({ sampling: 'point', sourceSampling: 'average' })[0]).toContain('order 2 shows whatever the scheme');
    expect(notes({ sampling: 'point', sourceSampling: 'point' })[0]).toContain('two such errors can cancel');
    expect(notes({ sampling: 'average', sourceSampling: 'average' })).toEqual(['Compare conserved variables: primitive ones formed from their averages are second order whatever the scheme.']);
  });
  it('says nothing below order 3, of finite elements, or where nothing is stated', () => {
    expect(notes({ sampling: 'average', sourceSampling: 'point' }, 2)).toEqual([]);
    expect(notes({ sampling: 'point', sourceSampling: 'average', elements: { degree: 3 } })).toEqual([]);
    expect(notes({})).toEqual([]);
  });
});
