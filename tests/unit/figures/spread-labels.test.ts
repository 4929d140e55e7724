import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadLabels } from '@/lib/figures/spread-labels';

describe('spreadLabels(wanted, gap, top, bottom)', () => {
  it('leaves labels alone that are far enough apart', () => {
    expect(spreadLabels([40, 90, 10], 17, 0, 200)).toEqual([40, 90, 10]);
  });

  it('parts two labels that touch by the same way each', () => {
    expect(spreadLabels([100, 103], 17, 0, 200)).toEqual([93, 110]);
  });

  it('keeps labels inside, and shares the room where they cannot all fit', () => {
    expect(spreadLabels([2, 3], 17, 5, 200)).toEqual([5, 22]);
    expect(spreadLabels([1, 2, 3], 17, 0, 20)).toEqual([0, 10, 20]);
  });

  it('keeps order, gap and limits for any wishes', () => {
    fc.assert(fc.property(fc.array(fc.double({ min: -50, max: 450, noNaN: true }), { maxLength: 8 }), (wanted) => {
      const placed = spreadLabels(wanted, 17, 0, 400);
      const sorted = wanted.map((wish, index) => [wish, placed[index] ?? NaN] as const).sort((a, b) => a[0] - b[0] || a[1] - b[1]);
      sorted.forEach(([, at], index) => {
        expect(at).toBeGreaterThanOrEqual(-1e-9);
        expect(at).toBeLessThanOrEqual(400 + 1e-9);
        if (index > 0) expect(at - (sorted[index - 1]?.[1] ?? 0)).toBeGreaterThanOrEqual(17 - 1e-6);
      });
    }));
  });
});
