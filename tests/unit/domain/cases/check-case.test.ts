import { describe, expect, it } from 'vitest';
import { checkCase } from '@/lib/domain/cases/check-case';
import { caseDefinitionSchema, type CaseKind } from '@/lib/domain/cases/definition';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';

const problem = problemDefinitionSchema.parse({ equation: 'heat', dimension: 2, exact: { T: 'x*y' } });
const without = problemDefinitionSchema.parse({ equation: 'none', dimension: 2 });
const paths = (definition: object, kind: CaseKind = 'order', on = problem) => checkCase(caseDefinitionSchema.parse(definition), on, kind).map((fault) => fault.path);
const field = (...norms: object[]) => ({ fields: [{ field: 'T', norms }] });

describe('checkCase', () => {
  it('takes each kind with what it is judged by', () => {
    expect(paths(field({ norm: 'L2', formalOrder: 2, tolerance: 0.1 }))).toEqual([]);
    expect(paths(field({ norm: 'Linf', expectExact: true }), 'exactness')).toEqual([]);
    expect(paths({ quantities: [{ name: 'drag', knownValue: 1, formalOrder: 2 }] }, 'benchmark')).toEqual([]);
    expect(paths({ quantities: [{ name: 'drag', target: 0.02, formalOrder: 2 }] }, 'solution')).toEqual([]);
  });
  it('lets L1 count beside L2 or L∞ only', () => {
    const lone = { norm: 'L1', formalOrder: 2 };
    expect(paths(field(lone))).toEqual(['fields.0.norms.0.counts']);
    expect(paths(field(lone, { norm: 'Linf', formalOrder: 2, counts: false }))).toEqual(['fields.0.norms.0.counts']);
    expect(paths(field(lone, { norm: 'Linf', formalOrder: 2 }))).toEqual([]);
    expect(paths(field({ norm: 'L1' }))).toEqual([]);
  });
  it('lets a tolerance only tighten the rule: 0.1 or 5 % of the order, for L∞ 0.2 or 10 %', () => {
    const tolerance = (norm: string, formalOrder: number, stated: number) => paths(field({ norm, formalOrder, tolerance: stated }));
    expect(tolerance('L2', 2, 0.1)).toEqual([]);
    expect(tolerance('L2', 2, 0.101)).toEqual(['fields.0.norms.0.tolerance']);
    expect(tolerance('L2', 4, 0.2)).toEqual([]);
    expect(tolerance('Linf', 2, 0.2)).toEqual([]);
    expect(tolerance('Linf', 4, 0.41)).toEqual(['fields.0.norms.0.tolerance']);
  });
  it('asks for fields of the exact solution, where there is one', () => {
    const other = { fields: [{ field: 'U', norms: [{ norm: 'L2', formalOrder: 2 }] }] };
    expect(paths(other)).toEqual(['fields.0.field']);
    expect(paths(other, 'order', without)).toEqual([]);
  });
  it('asks for as many counts along directions as there are', () => {
    expect(paths({ ...field({ norm: 'L2' }), gridPlan: [{ label: 'a', cellsPerDirection: [8, 8] }, { label: 'b', cellsPerDirection: [8] }] }))
      .toEqual(['gridPlan.1.cellsPerDirection']);
  });
});
