import { describe, expect, it } from 'vitest';
import { columnMappingSchema } from '@/lib/domain/columns/column-mapping';
import { matchColumns } from '@/lib/domain/columns/match-columns';

describe('matchColumns(header, needs)', () => {
  it('maps names that match by themselves', () => {
    const { mapping, missing } = matchColumns(['x', 'y', 'vol', 'T', 'dx'], { dimension: 2, fields: ['T'] });
    expect(missing).toEqual([]);
    expect(mapping).toEqual({ x: 'x', y: 'y', weight: 'vol', dx: 'dx', fields: { T: 'T' } });
    expect(columnMappingSchema.parse(mapping)).toEqual(mapping);
  });

  it.each(['w', 'weight', 'vol', 'volume', 'area'])('takes the weight from %s', (name) => {
    expect(matchColumns(['x', name, 'u'], { dimension: 1, fields: ['u'] }).mapping?.weight).toBe(name);
  });

  it('tells t from T', () => {
    expect(matchColumns(['x', 't', 'w'], { dimension: 1, fields: ['T'] })).toMatchObject({ mapping: null, missing: ['T'], found: { t: 't' } });
  });

  it('takes the distance from the boundary and the flag of rows there where they stand in the file', () => {
    expect(matchColumns(['x', 'w', 'u', 'distance', 'flag'], { dimension: 1, fields: ['u'] }).mapping).toMatchObject({ distance: 'distance', flag: 'flag' });
    expect(matchColumns(['x', 'w', 'distance'], { dimension: 1, fields: ['distance'] }).mapping).toEqual({ x: 'x', weight: 'w', fields: { distance: 'distance' } });
  });

  it('says what is missing, equal weights never being assumed', () => {
    expect(matchColumns(['X', 'u'], { dimension: 2, fields: ['u', 'v'] })).toEqual({ found: { fields: { u: 'u' } }, missing: ['v', 'x', 'y', 'weight'], mapping: null });
  });

  it('leaves the choice where two columns could be the weight, and w to a field of that name', () => {
    expect(matchColumns(['x', 'w', 'vol', 'u'], { dimension: 1, fields: ['u'] }).missing).toEqual(['weight']);
    expect(matchColumns(['x', 'w', 'vol', 'u'], { dimension: 1, fields: ['u', 'w'] }).mapping).toMatchObject({ weight: 'vol', fields: { u: 'u', w: 'w' } });
  });

  it('does not take a velocity for the weight', () => {
    expect(matchColumns(['x', 'y', 'z', 'u', 'v', 'w', 'p'], { dimension: 3, fields: ['p'] })).toMatchObject({ mapping: null, missing: ['weight'] });
    expect(matchColumns(['x', 'w [m/s]', 'p'], { dimension: 1, fields: ['p'] })).toMatchObject({ mapping: null, missing: ['weight'] });
    expect(matchColumns(['x', 'y', 'u', 'v', 'w'], { dimension: 2, fields: ['u', 'v'] }).mapping?.weight).toBe('w');
  });

  it('reads a unit in brackets as no part of the name, and an index as one', () => {
    const { mapping } = matchColumns(['x [m]', 'vol (m^2)', 'flow.u [m/s]'], { dimension: 1, fields: ['u'] });
    expect(mapping).toEqual({ x: 'x [m]', weight: 'vol (m^2)', fields: { u: 'flow.u [m/s]' } });
    expect(matchColumns(['x', 'vol', 'u[0]', 'u(1)'], { dimension: 1, fields: ['u'] }).missing).toEqual(['u']);
    expect(matchColumns(['x', 'vol', 'u [m/s]', 'u [ft/s]'], { dimension: 1, fields: ['u'] }).missing).toEqual(['u']);
  });

  it('takes the last part of a path where it is unique', () => {
    const { mapping } = matchColumns(['mesh/x', 'mesh/vol', 'flow.u'], { dimension: 1, fields: ['u'] });
    expect(mapping).toEqual({ x: 'mesh/x', weight: 'mesh/vol', fields: { u: 'flow.u' } });
    expect(matchColumns(['x', 'w', 'a/u', 'b/u'], { dimension: 1, fields: ['u'] }).missing).toEqual(['u']);
    expect(matchColumns(['x', 'w', 'u', 'b/u'], { dimension: 1, fields: ['u'] }).mapping?.fields).toEqual({ u: 'u' });
  });
});
