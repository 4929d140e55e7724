import { describe, expect, it } from 'vitest';
import { lowestOrder } from '@/lib/domain/matrix/lowest-order';
import { assessmentOf } from '../../../support/assessments';
import { errorSeries, quantitySeries } from '../../../support/series';

const h = [1 / 8, 1 / 16, 1 / 32, 1 / 64];
const powers = (order: number) => h.map((spacing) => spacing ** order);

describe('lowestOrder', () => {
  it('is lowest against the formal order, not in itself', () => {
    const lowest = lowestOrder(assessmentOf([errorSeries(h, powers(2)), errorSeries(h, powers(3), { field: 'v', formalOrder: 4 })]));
    expect(lowest).toMatchObject({ field: 'v', norm: 'L2', formalOrder: 4 });
    expect(lowest?.observed).toBeCloseTo(3, 9);
  });
  it('takes the order of the finest pair', () => {
    const errors = [1, 1 / 4, 1 / 16, 1 / 32];
    expect(lowestOrder(assessmentOf([errorSeries(h, errors)]))?.observed).toBeCloseTo(1, 12);
  });
  it('leaves out what does not count, and is null where nothing is judged', () => {
    expect(lowestOrder(assessmentOf([errorSeries(h, powers(1), { counts: false })]))).toBeNull();
    expect(lowestOrder(assessmentOf([errorSeries(h, powers(1), { formalOrder: null })]))).toBeNull();
  });
  it('speaks of a derived order where one replaces the formal one', () => {
    expect(lowestOrder(assessmentOf([errorSeries(h, powers(3), { derivedOrder: 3 })]))).toMatchObject({ formalOrder: 3 });
  });
  it('takes the quantity where no field is judged', () => {
    const fine = [...h].reverse();
    const drag = quantitySeries(fine, fine.map((spacing) => 1 + spacing ** 2), { formalOrder: 2 });
    const lowest = lowestOrder(assessmentOf([], [drag]));
    expect(lowest).toMatchObject({ field: 'drag', formalOrder: 2 });
    expect(lowest?.observed).toBeCloseTo(2, 6);
  });
});
