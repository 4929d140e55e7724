import { describe, expect, it } from 'vitest';
import { columnNeeds, equalWeights, firstChoices, mappingOf } from '@/app/(organisation)/[org]/studies/[id]/_components/column-choices';

const needs = columnNeeds({ dimension: 2, needsTime: false, fields: ['u'] });

describe('the choices of columns', () => {
  it('asks for coordinates, weight and fields, and for the time only where nothing else states it', () => {
    expect(needs.map(({ key }) => key)).toEqual(['x', 'y', 'weight', 'field u']);
    expect(columnNeeds({ dimension: 1, needsTime: true, fields: [] }).map(({ key }) => key)).toEqual(['x', 't', 'weight']);
  });

  it('begins with what is in force, else with what names propose, and only with columns that are there', () => {
    const header = ['x', 'y', 'vol', 'U'];
    expect(firstChoices(needs, { header, mapping: null, proposal: { x: 'x', y: 'y', weight: 'vol', fields: {} } }))
      .toEqual({ x: 'x', y: 'y', weight: 'vol', 'field u': '' });
    expect(firstChoices(needs, { header, mapping: { x: 'cx', y: 'y', weight: null, fields: { u: 'U' } }, proposal: { fields: {} } }))
      .toEqual({ x: '', y: 'y', weight: equalWeights, 'field u': 'U' });
  });

  it('comes to a mapping once everything is chosen, and keeps what was mapped besides', () => {
    expect(mappingOf({ x: 'x', y: 'y', weight: '', 'field u': 'U' }, null)).toBeNull();
    expect(mappingOf({ x: 'x', y: 'y', weight: equalWeights, 'field u': 'U' }, { x: 'a', weight: 'w', distance: 'd', fields: { p: 'P' } }))
      .toEqual({ x: 'x', y: 'y', weight: null, distance: 'd', fields: { p: 'P', u: 'U' } });
  });
});
