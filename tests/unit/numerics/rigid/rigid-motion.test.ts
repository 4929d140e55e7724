import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solveLeastSquares } from '@/lib/numerics/fitting/solve-least-squares';
import { createRigidGatherer } from '@/lib/numerics/rigid/rigid-gatherer';
import { bestRigidMotion, motionComponent, type RigidMotion } from '@/lib/numerics/rigid/rigid-motion';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

function motionOf(points: readonly number[][], errors: readonly number[][], { weights, origin, parts = 1 }: { weights?: number[]; origin?: number[]; parts?: number } = {}): RigidMotion {
  const dimension = points[0]?.length ?? 1;
  const gatherer = createRigidGatherer(origin ?? Array.from({ length: dimension }, () => 0));
  const total = createRigidGatherer(origin ?? Array.from({ length: dimension }, () => 0));
  const size = Math.ceil(points.length / parts);
  for (let from = 0; from < points.length; from += size) {
    const [some, at] = [points.slice(from, from + size), from];
    gatherer.add({
      rows: some.length, weights: weights ? Float64Array.from(weights.slice(at, at + size)) : null,
      coordinates: Array.from({ length: dimension }, (_, axis) => Float64Array.from(some, (point) => point[axis] ?? 0)),
      components: Array.from({ length: dimension }, (_, i) => ({ values: Float64Array.from(errors.slice(at, at + size), (error) => (error[i] ?? 0) + 2), exact: new Float64Array(some.length).fill(2) })),
    });
    total.addPart(gatherer.takePart());
  }
  return bestRigidMotion(total.sums());
}
const at = (motion: RigidMotion, point: readonly number[]) => point.map((_, i) => {
  const { value, gradient } = motionComponent(motion, i);
  return gradient.reduce((sum, slope, axis) => sum + slope * ((point[axis] ?? 0) - (motion.centre[axis] ?? 0)), value);
});

describe('bestRigidMotion(sums)', () => {
  const lattice = (dimension: number) => Array.from({ length: 5 ** dimension }, (_, i) => Array.from({ length: dimension }, (__, axis) => (Math.floor(i / 5 ** axis) % 5) / 4 + axis));

  it('finds a motion that was put in, in one, two and three dimensions', () => {
    fc.assert(fc.property(fc.array(number(-1, 1), { minLength: 6, maxLength: 6 }), fc.integer({ min: 1, max: 3 }), fc.integer({ min: 1, max: 4 }), ([a = 0, b = 0, c = 0, p = 0, q = 0, r = 0], dimension, parts) => {
      const points = lattice(dimension);
      const spin = (x: number[]) => (dimension === 3
        ? [q * (x[2] ?? 0) - r * (x[1] ?? 0), r * (x[0] ?? 0) - p * (x[2] ?? 0), p * (x[1] ?? 0) - q * (x[0] ?? 0)]
        : dimension === 2 ? [-r * (x[1] ?? 0), r * (x[0] ?? 0)] : [0]);
      const moved = points.map((point) => spin(point).map((turn, i) => turn + ([a, b, c][i] ?? 0)));
      const found = motionOf(points, moved, { parts });
      expect(found.rotation.length).toBe([0, 1, 3][dimension - 1]);
      (dimension === 3 ? [p, q, r] : [r]).slice(0, found.rotation.length).forEach((turn, i) => expect(found.rotation[i]).toBeCloseTo(turn, 11));
      points.forEach((point, row) => at(found, point).forEach((value, i) => expect(value).toBeCloseTo(moved[row]?.[i] ?? NaN, 11)));
    }), { numRuns: 40 });
  });

  it('is the weighted least-squares fit of translation and rotation, by another solver', () => {
    const place = fc.integer({ min: -20, max: 20 }).map((i) => i / 10);
    fc.assert(fc.property(fc.array(fc.record({ x: place, y: place, u: number(-1, 1), v: number(-1, 1), w: number(0.1, 3) }), { minLength: 4, maxLength: 12 }), (rows) => {
      const [points, errors, weights] = [rows.map(({ x, y }) => [x, y]), rows.map(({ u, v }) => [u, v]), rows.map(({ w }) => w)];
      const fit = solveLeastSquares(rows.flatMap(({ x, y }) => [[1, 0, -y], [0, 1, x]]), errors.flat(), weights.flatMap((w) => [w, w]));
      fc.pre(fit !== null);
      const found = motionOf(points, errors, { weights, origin: [0.3, -0.1] });
      const [a = 0, b = 0, turn = 0] = fit ?? [];
      rows.forEach(({ x, y }) => {
        const [u, v] = at(found, [x, y]);
        expect(u).toBeCloseTo(a - turn * y, 8);
        expect(v).toBeCloseTo(b + turn * x, 8);
      });
    }), { numRuns: 60 });
  });

  it('turns nothing about a line or a point that all rows lie on', () => {
    const line = Array.from({ length: 6 }, (_, i) => [i, 0, 0]);
    const found = motionOf(line, line.map(([x = 0]) => [0, 0.2 * x, 0.1]));
    expect(found.rotation.map((turn) => Number(turn.toFixed(6)) + 0)).toEqual([0, 0, 0.2]);
    expect(motionOf([[1, 2, 3]], [[4, 5, 6]])).toEqual({ centre: [1, 2, 3], translation: [4, 5, 6], rotation: [0, 0, 0] });
    expect(() => bestRigidMotion({ origin: [0], products: [[0, 0], [0, 0]], errors: [[0, 0]] })).toThrow('the sum of weights must be above 0, got 0');
  });

  it('is the same of rows permuted, and of rows split into two of half their weight', () => {
    const row = fc.record({ x: fc.integer({ min: -9, max: 9 }), y: fc.integer({ min: -9, max: 9 }), u: number(-1, 1), v: number(-1, 1), w: number(0.1, 3) });
    fc.assert(fc.property(fc.array(row, { minLength: 3, maxLength: 10 }), fc.nat(), (rows, seed) => {
      const of = (some: typeof rows) => motionOf(some.map(({ x, y }) => [x, y]), some.map(({ u, v }) => [u, v]), { weights: some.map(({ w }) => w) });
      const at = seed % rows.length;
      const [found, turned, split] = [of(rows), of(rows.toReversed()), of(rows.flatMap((each, i) => (i === at ? [{ ...each, w: each.w / 2 }, { ...each, w: each.w / 2 }] : [each])))];
      for (const other of [turned, split]) {
        for (const member of ['centre', 'translation', 'rotation'] as const) found[member].forEach((value, i) => expect(other[member][i]).toBeCloseTo(value, 10));
      }
    }), { numRuns: 60 });
  });

  it('keeps its digits far from the origin where coordinates are taken from near', () => {
    const points = lattice(2).map(([x = 0, y = 0]) => [x + 1e6, y - 1e6]);
    const found = motionOf(points, points.map(([x = 0, y = 0]) => [-0.01 * (y + 1e6), 0.01 * (x - 1e6)]), { origin: [1e6, -1e6] });
    expect(found.rotation[0]).toBeCloseTo(0.01, 12);
  });
});
