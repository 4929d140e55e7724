import { describe, expect, it } from 'vitest';
import { checkProblemValues, emptyProblem, problemField, type ProblemValues } from '@/app/_components/problems/problem-values';

const typed: ProblemValues = {
  ...emptyProblem, name: 'Layer', dimension: '2',
  exact: [{ name: 'u', text: 'sin(k*x)*y' }, { name: '', text: '' }], constants: [{ name: 'k', text: '2*pi' }, { name: 'nu', text: '0.1' }],
  domain: [{ from: '0', to: '1' }, { from: '', to: '' }, { from: '5', to: '' }],
};

const faultsOf = (values: ProblemValues) => {
  const checked = checkProblemValues(values);
  return checked.ok ? [] : checked.faults.map(({ path }) => problemField(path, values));
};

describe('checkProblemValues(values)', () => {
  it('gives what the API takes: blank rows left out, plain numbers as numbers', () => {
    const checked = checkProblemValues(typed);
    expect(checked).toMatchObject({ ok: true, typed: { name: 'Layer', dimension: 2, exact: { u: 'sin(k*x)*y' }, constants: { k: '2*pi', nu: 0.1 }, domain: { x: [0, 1] } } });
  });

  it('names the field of the form for each fault', () => {
    expect(faultsOf({ ...typed, exact: [{ name: 'u', text: 'sin(2x)' }] })).toEqual(['exact.0.text']);
    expect(faultsOf({ ...typed, constants: [{ name: 'k', text: '1' }, { name: 'k', text: '2' }] })).toEqual(['constants.1.name']);
    expect(faultsOf({ ...typed, exact: [{ name: '2u', text: 'x' }] })).toEqual(['exact.0.name']);
    expect(faultsOf({ ...typed, domain: [{ from: '0', to: '1,5x' }, { from: '1', to: '0' }] })).toEqual(['domain.0.to']);
    expect(faultsOf({ ...typed, domain: [{ from: '1', to: '0' }] })).toEqual(['domain.0.from']);
  });

  it('checks expressions also while the name is missing', () => {
    expect(faultsOf({ ...typed, name: '', exact: [{ name: 'u', text: 'q*x' }] })).toEqual(['name', 'exact.0.text']);
  });
});
