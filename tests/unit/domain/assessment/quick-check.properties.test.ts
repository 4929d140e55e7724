import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assessQuickCheck } from '@/lib/domain/assessment/quick-check';
import { quickCheckSchema } from '@/lib/domain/assessment/quick-schema';
import { assessmentSchema } from '@/lib/domain/assessment/schema';
import { norms, procedures } from '@/lib/numerics/assessment';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const extreme = fc.constantFrom(5e-324, 1e-300, 1e-12, 1, 1e12, 1e100, 1.7e308);
const maybe = <T>(of: fc.Arbitrary<T>) => fc.option(of, { nil: undefined });
const anyOrder = number(0.1, 20);

/** Numbers of an answer that are not finite, or members that are undefined, by path. */
function notJson(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`];
  if (value === undefined) return [`${path} is undefined`];
  return typeof value === 'object' && value !== null ? Object.entries(value).flatMap(([name, member]) => notJson(member, `${path}.${name}`)) : [];
}

const spacing = fc.oneof(
  fc.record({ h: fc.oneof(number(1e-6, 1e3), fc.constantFrom(1e-100, 1e-12, 1e12, 1e100)) }), fc.record({ cells: fc.integer({ min: 1, max: 1e9 }) }), fc.record({ cellsPerDirection: fc.integer({ min: 1, max: 4096 }) }),
);
const ofErrors = fc.uniqueArray(fc.constantFrom(...norms), { minLength: 1, maxLength: 3 }).chain((stated) => {
  const errors = fc.record(Object.fromEntries(stated.map((norm) => [norm, fc.oneof(number(0, 1e3), fc.constant(0), extreme)])));
  return fc.record({
    grids: fc.array(fc.tuple(spacing, errors).map(([place, values]) => ({ ...place, errors: values })), { minLength: 2, maxLength: 7 }),
    formalOrder: maybe(anyOrder), minimumGrids: maybe(fc.constant(3)), expectExact: maybe(fc.boolean()), exactLimit: maybe(number(1e-12, 1)), reference: maybe(fc.oneof(number(1e-3, 1e3), extreme)),
  });
});
const ofValues = fc.record({
  grids: fc.array(fc.tuple(spacing, fc.oneof(number(-1e3, 1e3), fc.constantFrom(0, 1, 1, -1e100, 1e100, 5e-324)), maybe(number(1e-9, 1))).map(([place, value, resolution]) => ({ ...place, value, resolution })), { minLength: 2, maxLength: 7 }),
  formalOrder: anyOrder, target: maybe(number(1e-6, 1)), procedure: maybe(fc.constantFrom(...procedures)), uNumFactor: maybe(number(1, 3)),
});
const ofKnown = ofValues.map(({ grids, formalOrder }) => ({ grids, formalOrder, knownValue: 1 }));

/** A request as JSON carries it, without members that are not stated. */
const asJson = (request: object) => quickCheckSchema.safeParse(JSON.parse(JSON.stringify(request)));

describe('assessQuickCheck(input)', () => {
  it.each([['errors', ofErrors], ['values', ofValues], ['a known value', ofKnown]] as const)('answers what JSON can hold, or faults, for any request of %s', (_, requests) => {
    fc.assert(fc.property(requests, fc.integer({ min: 1, max: 3 }), (request, dimension) => {
      const parsed = asJson({ ...request, dimension });
      fc.pre(parsed.success);
      if (!parsed.success) return;
      const result = assessQuickCheck(parsed.data);
      if (!result.ok) {
        expect(result.faults.length).toBeGreaterThan(0);
        return;
      }
      expect(notJson(result.assessment)).toEqual([]);
      expect(assessmentSchema.omit({ inputs: true, inputsSha256: true }).safeParse(result.assessment).success).toBe(true);
    }), { numRuns: 400 });
  });

  it('answers the same whatever order the grids come in, but for names', () => {
    fc.assert(fc.property(ofErrors, (request) => {
      const labelled = { ...request, grids: request.grids.map((grid, index) => ({ ...grid, label: `g${index}` })) };
      const [forward, backward] = [asJson(labelled), asJson({ ...labelled, grids: labelled.grids.toReversed() })];
      fc.pre(forward.success && backward.success);
      if (!forward.success || !backward.success) return;
      const [found, again] = [assessQuickCheck(forward.data), assessQuickCheck(backward.data)];
      expect(again.ok).toBe(found.ok);
      if (found.ok) expect(again).toEqual(found);
    }), { numRuns: 100 });
  });
});
