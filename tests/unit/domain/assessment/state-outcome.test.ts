import { describe, expect, it } from 'vitest';
import { stateOutcome } from '@/lib/domain/assessment/state-outcome';
import { assessSeries } from '@/lib/numerics/assess-series';
import type { ErrorSeries, QuantitySeries } from '@/lib/numerics/assessment';
import { errorSeries, quantitySeries } from '../../../support/series';

const halvings = [1, 0.5, 0.25, 0.125];
const powers = (order: number, changes: Partial<ErrorSeries> = {}, h: readonly number[] = halvings) => errorSeries(h, h.map((spacing) => spacing ** order), changes);
const state = (errors: ErrorSeries[], quantities: QuantitySeries[] = []) => stateOutcome(assessSeries({ errors, quantities }));

describe('stateOutcome(assessment)', () => {
  it('states the last ratio beside the one promised', () => {
    expect(state([powers(1.99)])).toEqual({ outcome: 'pass', sentence: 'Halving the spacing divides the L2 error of u by 3.97; second order would divide it by 4.' });
  });
  it('quotes the counting norm farthest from its formal order', () => {
    const { sentence } = state([powers(2), powers(1.98, { field: 'v' }), powers(1.5, { field: 'w', norm: 'Linf', counts: false })]);
    expect(sentence).toBe('Halving the spacing divides the L2 error of v by 3.94; second order would divide it by 4.');
  });
  it('quotes one that fails where the study fails', () => {
    const { outcome, sentence } = state([powers(2.5), powers(1.6, { field: 'v' })]);
    expect(outcome).toBe('fail');
    expect(sentence).toBe('Halving the spacing divides the L2 error of v by 3.03; second order would divide it by 4.');
  });
  it('states another ratio than 2 as it was, and a time step as such', () => {
    expect(state([powers(2, {}, [1, 1 / 1.5, 1 / 2.25, 1 / 3.375])]).sentence).toBe('Refining the spacing by a ratio of 1.50 divides the L2 error of u by 2.25; second order would divide it by 2.25.');
    expect(stateOutcome(assessSeries({ errors: [powers(2)], quantities: [] }), 'time').sentence).toMatch(/^Halving the time step divides/);
  });
  it('speaks of differences where grids are compared with each other, whatever their ratios', () => {
    const h = [1, 0.5, 0.25, 0.1, 0.05];
    const differences = h.slice(1).map((fine, index) => (h[index] ?? 0) ** 2 - fine ** 2);
    const compared = errorSeries(h.slice(1), differences, { comparedTo: { label: 'coarsest', h: 1 }, minimumGrids: 4 });
    expect(state([compared])).toEqual({ outcome: 'pass', sentence: 'Halving the spacing divides the L2 difference of u between successive grids by 7.00; second order would divide it by 7.' });
    expect(state([{ ...compared, minimumGrids: 6 }]).sentence).toBe('There are 5 grids; more are asked for.');
  });
  it('says so where the error grows', () => {
    expect(state([errorSeries(halvings, [1, 1.05, 1.1, 1.21])]).sentence).toBe('Halving the spacing multiplies the L2 error of u by 1.10; second order would divide it by 4.');
  });
  it('names a derived order where one is declared', () => {
    expect(state([powers(3, { derivedOrder: 3 })]).sentence).toBe('Halving the spacing divides the L2 error of u by 8.00; third order would divide it by 8.');
  });
  it('gives the ratio alone without a formal order', () => {
    expect(state([powers(2, { formalOrder: null })])).toEqual({ outcome: null, sentence: 'Halving the spacing divides the L2 error of u by 4.00.' });
  });
  it('gives the reason where a ratio says nothing', () => {
    expect(state([powers(2, { minimumGrids: 5 })]).sentence).toBe('There are 4 grids; more are asked for.');
    expect(state([errorSeries(halvings, [2e-15, 1e-15, 2e-15, 3e-15], { expectExact: true })]).sentence).toMatch(/^The L2 error of u is 3\.00\u00A0×\u00A010⁻¹⁵ at most/);
    expect(state([powers(2, { counts: false })]).sentence).toBe('The one norm assessed, L2 of u, does not count.');
  });

  it('states order, extrapolated value and GCI of a quantity', () => {
    // Wall gradient of a channel on 16, 24, 36 and 54 cells per direction.
    const h = [1 / 54, 1 / 36, 1 / 24, 1 / 16];
    const series = quantitySeries(h, [0.636408859, 0.63735263, 0.63948153, 0.644284473], { name: 'wall gradient' });
    expect(state([], [series]).sentence).toBe('The values of wall gradient converge monotonically with order 2.01 towards 0.6357. On the finest grid the grid convergence index is 0.15\u202F%.');
  });
  it('states a GCI in the unit where the value is near zero', () => {
    expect(state([], [quantitySeries([1, 2, 4], [0.251, 1.001, 4.003], { unit: 'm/s' })]).sentence).toMatch(/index is 0\.31 m\/s\.$/);
  });
  it('writes no noise for an extrapolated value within its GCI of zero', () => {
    expect(state([], [quantitySeries([1, 2, 4], [0.25, 1, 4])]).sentence).toBe('The values of drag converge monotonically with order 2.00 towards 0.0. On the finest grid the grid convergence index is 0.31.');
  });
  it('states how values behave that do not converge monotonically', () => {
    expect(state([], [quantitySeries([1, 2, 4], [100.2, 101.1, 98.4], { unit: 'N' })]).sentence).toMatch(/^The values of drag oscillate .* is 1\.\d N\.$/);
    expect(state([], [quantitySeries([1, 2, 4], [100, 104, 106])]).sentence).toBe('The values of drag move further apart as the grid is refined: half their range is 3.0.');
    expect(state([], [quantitySeries([1, 2], [101, 104], { formalOrder: 2, target: 0.01 })]).sentence).toMatch(/^Two grids show no order; with the formal order 2 /);
  });
  it('quotes the quantity nearest to missing its target', () => {
    const drag = quantitySeries([1, 2, 4], [100.25, 101, 104], { formalOrder: 2, target: 0.01 });
    expect(state([], [drag, { ...drag, name: 'lift', target: 0.004 }]).sentence).toMatch(/^The values of lift/);
  });
});
