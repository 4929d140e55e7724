import { describe, expect, it } from 'vitest';
import { gridConvergenceIndex } from '@/lib/numerics/uncertainty/grid-convergence-index';
import { richardson } from '@/lib/numerics/uncertainty/richardson';
import { threeGridFigures } from '@/lib/numerics/uncertainty/three-grid-figures';

const at = (h: number, value: number) => ({ h, value });

describe('richardson(fine, coarse, order)', () => {
  it('recovers φ0 of φ0 + αh²', () => expect(richardson(at(0.1, 3.01), at(0.3, 3.09), 2)).toBeCloseTo(3, 12));
  it('throws for an order of 0 or less', () => expect(() => richardson(at(0.1, 1), at(0.2, 2), 0)).toThrow('order must be above 0, got 0'));
});

describe('gridConvergenceIndex({fine, coarse}, order, safety factor)', () => {
  it('is Fs·|ε21|/(r^p − 1), as a fraction of |φ1| and in the unit', () => {
    const { fraction, absolute } = gridConvergenceIndex({ fine: at(1, -2), coarse: at(2, -2.3) }, 2, 1.25);
    expect(absolute).toBeCloseTo(0.125, 12);
    expect(fraction).toBeCloseTo(0.0625, 12);
  });
  it('has no fraction of a value of 0', () => expect(gridConvergenceIndex({ fine: at(1, 0), coarse: at(2, 3) }, 2, 1.25)).toEqual({ fraction: null, absolute: 1.25 }));
  it('throws for an order of 0 or less', () => expect(() => gridConvergenceIndex({ fine: at(1, 1), coarse: at(2, 2) }, -1, 3)).toThrow('order must be above 0, got -1'));
});

describe('threeGridFigures(fine, middle, coarse, order)', () => {
  it('has an asymptotic ratio of |φ1/φ2| with the order of the same grids', () => {
    const figures = threeGridFigures(at(1, 1.1), at(2, 1.4), at(4, 2.6), 2);
    expect(figures.asymptoticRatio).toBeCloseTo(1.1 / 1.4, 12);
    expect(figures).toMatchObject({ safetyFactor: 1.25 });
    expect(figures.extrapolated).toBeCloseTo(1, 12);
    expect(figures.extrapolatedError).toBeCloseTo(0.1, 12);
  });
  it('takes a safety factor of 3 and no coarse pair with two grids', () => {
    expect(threeGridFigures(at(1, 1.1), at(2, 1.4), null, 2)).toMatchObject({ safetyFactor: 3, gciCoarse: null, asymptoticRatio: null });
  });
});
