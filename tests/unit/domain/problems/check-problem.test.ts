import { describe, expect, it } from 'vitest';
import { checkProblem } from '@/lib/domain/problems/check-problem';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';

const check = (changes: object) => checkProblem(problemDefinitionSchema.parse({ equation: 'heat', dimension: 2, exact: { T: 'x*y' }, ...changes }));

describe('checkProblem', () => {
  it('finds nothing wrong with a plain problem, or with one without an exact solution', () => {
    expect(check({})).toEqual([]);
    expect(check({ exact: undefined })).toEqual([]);
    expect(check({ constants: { a: 2, k: '1+a*x' }, exact: { T: 'k*exp(-t)' }, unsteady: true, domain: { x: [0, 1], y: [-1, 1] } })).toEqual([]);
  });
  it('lists every fault, each with the path of its member', () => {
    const faults = check({ constants: { k: '2x' }, exact: { T: 'q', S: 'z' }, domain: { x: [1, 1], z: [0, 1] } });
    expect(faults.map((fault) => fault.path).sort()).toEqual(['constants.k', 'domain.x', 'domain.z', 'exact.S', 'exact.T']);
  });
  it('names the character, counted from 1', () => expect(check({ exact: { T: 'x + 3 cm' } })[0]?.message).toMatch(/^Character 7: /));
  it('refuses names that mean something else, once each', () => {
    for (const name of ['x', 'z', 't', 'd', 'pi', 'sin']) expect(check({ exact: { [name]: '1' } }).map((fault) => fault.path)).toEqual([`exact.${name}`]);
  });
  it('refuses circles', () => expect(check({ constants: { a: 'b', b: 'a' } }).length).toBeGreaterThan(0));
});
