import { describe, expect, it } from 'vitest';
import { judgeQuantity } from '@/lib/numerics/outcome/judge-quantity';
import { fitPowerTerm } from '@/lib/numerics/uncertainty/value-fit';
import { quantitySeries } from '../support/series';
import { readReference } from './reference';

interface Fit { order: number; extrapolated: number; sigma: number; alpha: number; uncertainty: number }
interface Reference { h: number[]; phi: number[]; recomputed: { unweighted: Fit; weighted: Fit; threeGrid421: Fit } }

const { h, phi, recomputed } = readReference<Reference>('least-squares.json');
const grids = h.map((spacing, i) => ({ h: spacing, value: phi[i] ?? Number.NaN })).reverse();

// ASME V&V Symposium 2017 workshop, 13 grids; fits recomputed from Eça and Hoekstra, J. Comput. Phys. 262 (2014) 104.
describe('least squares on 13 grids of the ASME V&V 2017 workshop', () => {
  it.each([['unweighted', false], ['weighted', true]] as const)('%s fit', (name, weighted) => {
    const found = fitPowerTerm(grids, weighted);
    expect(found?.order).toBeCloseTo(recomputed[name].order, 5);
    expect(found?.value0).toBeCloseTo(recomputed[name].extrapolated, 7);
    expect(found?.sigma).toBeCloseTo(recomputed[name].sigma, 7);
  });

  it('takes the weighted fit, whose spread is smaller, with a safety factor of 1.25', () => {
    const found = judgeQuantity(quantitySeries(grids.map((grid) => grid.h), grids.map((grid) => grid.value), { procedure: 'least-squares', formalOrder: 2, uNumFactor: 2 }));
    expect(found).toMatchObject({ procedure: 'least-squares', branch: 'power', safetyFactor: 1.25, gci: null, fit: { kind: 'power', weighted: true, atBound: null } });
    expect(found.orderObserved).toBeCloseTo(recomputed.weighted.order, 5);
    expect(found.fit?.alpha[0]).toBeCloseTo(recomputed.weighted.alpha, 7);
    expect(found.uncertainty).toBeCloseTo(recomputed.weighted.uncertainty, 6);
    expect(found.uNum).toBeCloseTo(recomputed.weighted.uncertainty / 2, 6);
    expect(found.fit?.uncertainty).toHaveLength(13);
  });

  it('three grids at 1, 2 and 4', () => {
    const three = grids.filter((grid) => [1, 2, 4].includes(grid.h));
    const found = judgeQuantity(quantitySeries(three.map((grid) => grid.h), three.map((grid) => grid.value)));
    expect(found.orderObserved).toBeCloseTo(recomputed.threeGrid421.order, 7);
    expect(found.extrapolated).toBeCloseTo(recomputed.threeGrid421.extrapolated, 7);
  });
});
