import { describe, expect, it } from 'vitest';
import { checkCaseValues } from '@/app/_components/cases/case-definition';
import { caseField } from '@/app/_components/cases/case-field';
import { emptyCase, newField, valuesOfCase, type CaseValues } from '@/app/_components/cases/case-values';
import { plannedGrids } from '@/app/_components/cases/planned-grids';
import type { Case } from '@/lib/domain/cases/schema';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';

const problem: ProblemDefinition = { equation: 'heat', dimension: 2, unsteady: false, constants: {}, exact: { T: 'x*y' } };
const field = newField('T');
const typed: CaseValues = {
  ...emptyCase({ code: 'brack', problem: 'plate' }), name: 'Plate',
  fields: [{ ...field, citation: 'Two-point flux', norms: field.norms.slice(0, 3).map((norm) => ({ ...norm, formalOrder: '2', counts: norm.norm !== 'L1' })) }],
  gridPlan: plannedGrids({ coarsest: '8', ratio: '2', count: '3', spacingAs: 'cellsPerDirection', dimension: 2 }) ?? [],
};

const faultsOf = (values: CaseValues) => {
  const checked = checkCaseValues(values, problem);
  return checked.ok ? [] : checked.faults.map(({ path }) => caseField(path, values));
};

describe('checkCaseValues(values, problem)', () => {
  it('gives what the API takes', () => {
    expect(checkCaseValues(typed, problem)).toMatchObject({
      ok: true, typed: {
        kind: 'order', fields: [{ field: 'T', norms: [{ norm: 'L1', counts: false }, { norm: 'L2', formalOrder: 2, backing: { citation: 'Two-point flux' } }, { norm: 'Linf' }] }],
        gridPlan: [{ label: 'n8', cellsPerDirection: 8 }, { label: 'n16', cellsPerDirection: 16 }, { label: 'n32', cellsPerDirection: 32 }],
      },
    });
  });

  it('names the field of the form for each fault', () => {
    const [own] = typed.fields;
    const norms = own?.norms ?? [];
    const withNorm = (at: number, part: object) => ({ ...typed, fields: [{ ...field, norms: norms.map((norm, index) => (index === at ? { ...norm, ...part } : norm)) }] });
    expect(faultsOf(withNorm(1, { tolerance: '0,1x' }))).toEqual(['fields.0.norms.1.tolerance']);
    expect(faultsOf(withNorm(1, { tolerance: '0.5' }))).toEqual(['fields.0.norms.1.tolerance']);
    expect(faultsOf({ ...typed, fields: [] })).toEqual(['fields.root']);
    expect(faultsOf({ ...typed, gridPlan: [{ label: '', spacing: '', dt: '', kept: null }, { label: 'a', spacing: '8 x 8 x 8', dt: '', kept: null }] })).toEqual(['gridPlan.1.spacing']);
  });

  it('keeps what the form does not ask for', () => {
    const found = {
      name: 'Plate', slug: 'plate', kind: 'order', code: { id: '1', slug: 'brack', name: 'brack' }, problem: { id: '2', slug: 'plate', name: 'Plate' },
      options: {}, quantities: [], requirements: [], sampling: undefined, minimumGrids: undefined, columns: null,
      fields: [{ field: 'T', datum: 'none', norms: [{ norm: 'L2', formalOrder: 2, counts: true, expectExact: false, reference: 3 }] }],
      gridPlan: [{ label: 'a', cells: 64, dt: 0.5 }],
    } as unknown as Case;
    const checked = checkCaseValues(valuesOfCase(found), problem);
    expect(checked).toMatchObject({ ok: true, typed: { fields: [{ norms: [{ norm: 'L2', reference: 3 }] }], gridPlan: [{ label: 'a', cells: 64, dt: 0.5 }] } });
  });
});

describe('plannedGrids(series)', () => {
  it('multiplies cells in all by the ratio along each direction', () => {
    expect(plannedGrids({ coarsest: '64', ratio: '2', count: '3', spacingAs: 'cells', dimension: 2 })?.map(({ spacing }) => spacing)).toEqual(['64', '256', '1024']);
  });

  it('is null while the series cannot be told', () => {
    expect(plannedGrids({ coarsest: '', ratio: '2', count: '5', spacingAs: 'h', dimension: 1 })).toBeNull();
    expect(plannedGrids({ coarsest: '0.1', ratio: '1', count: '5', spacingAs: 'h', dimension: 1 })).toBeNull();
  });
});
