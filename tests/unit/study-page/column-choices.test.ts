import { describe, expect, it } from 'vitest';
import {
  choiceFaults, columnNeeds, equalWeights, firstChoices, mappingOf, mapsItself, noColumn,
} from '@/app/(organisation)/[org]/studies/[id]/_components/column-choices';
import { mostOffered, offeredColumns } from '@/app/(organisation)/[org]/studies/[id]/_components/offered-columns';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';

const define = (norms: string[], more: object = {}) => caseDefinitionSchema.parse({ fields: [{ field: 'u', norms: norms.map((norm) => ({ norm })) }], ...more });
const plain = columnNeeds({ dimension: 2, needsTime: false, definition: define(['L2']) });
const graded = columnNeeds({ dimension: 2, needsTime: false, definition: define(['L2', 'H1']) });
const keysOf = (needs: readonly { key: string }[]) => needs.map(({ key }) => key);
const chosen = { x: 'x', y: 'y', weight: equalWeights, 'value u': 'U', distance: noColumn, flag: noColumn };

describe('what needs a column', () => {
  it('is every coordinate, the weight and the fields, and the time where nothing else states it', () => {
    expect(keysOf(plain)).toEqual(['x', 'y', 'weight', 'value u', 'distance', 'flag']);
    expect(keysOf(columnNeeds({ dimension: 1, needsTime: true, definition: { fields: [] } }))).toEqual(['x', 't', 'weight', 'distance', 'flag']);
  });

  it('is the gradient where a norm asks for it, and the sizes of cells where averages are compared', () => {
    expect(keysOf(graded)).toEqual(['x', 'y', 'weight', 'value u', 'gradient u x', 'gradient u y', 'distance', 'flag']);
    expect(keysOf(columnNeeds({ dimension: 1, needsTime: false, definition: define(['L1'], { sampling: 'average' }) }))).toEqual(['x', 'weight', 'value u', 'dx', 'distance', 'flag']);
  });
});

describe('the choices of columns', () => {
  it('begin with what is in force, else with what names propose, and only with columns that are there', () => {
    const header = ['x', 'y', 'vol', 'U', 'flag'];
    expect(firstChoices(plain, { header, mapping: null, proposal: { x: 'x', y: 'y', weight: 'vol', flag: 'flag', fields: {} } }))
      .toEqual({ x: 'x', y: 'y', weight: 'vol', 'value u': '', distance: noColumn, flag: 'flag' });
    expect(firstChoices(plain, { header, mapping: { x: 'cx', y: 'y', weight: null, distance: 'wall', fields: { u: 'U' } }, proposal: { fields: {} } }))
      .toEqual({ x: '', y: 'y', weight: equalWeights, 'value u': 'U', distance: '', flag: noColumn });
  });

  it('ask whether the file has a gradient, unless the mapping in force says so', () => {
    const header = ['x', 'y', 'w', 'U', 'u_x', 'u_y'];
    const proposal = { x: 'x', y: 'y', weight: 'w', fields: {} };
    expect(firstChoices(graded, { header, mapping: null, proposal })).toMatchObject({ 'value u': '', 'gradient u x': '', 'gradient u y': '' });
    expect(firstChoices(graded, { header, mapping: { x: 'x', weight: 'w', fields: { u: 'U' } }, proposal })).toMatchObject({ 'value u': 'U', 'gradient u x': noColumn });
    expect(firstChoices(graded, { header, mapping: null, proposal: { ...proposal, fields: { u: ['U', 'u_x', 'u_y'] } } }))
      .toMatchObject({ 'value u': 'U', 'gradient u x': 'u_x', 'gradient u y': 'u_y' });
    expect(firstChoices(graded, { header, mapping: null, proposal: { ...proposal, fields: { u: ['u_x', 'u_y'] } } })).toMatchObject({ 'value u': '', 'gradient u y': 'u_y' });
  });

  it('are no free ones where a name is known by itself', () => {
    const flag = plain.find(({ key }) => key === 'flag');
    if (!flag) throw new Error('No flag among the needs.');
    expect(mapsItself(flag, ['x', 'mesh/flag'])).toBe(true);
    expect(mapsItself(flag, ['x', 'wall'])).toBe(false);
  });

  it('are at fault where something lacks, or a direction is without what another has', () => {
    expect([...choiceFaults(plain, { ...chosen, weight: '' }).keys()]).toEqual(['weight']);
    expect([...choiceFaults(graded, { ...chosen, 'gradient u x': 'u_x', 'gradient u y': noColumn }).keys()]).toEqual(['gradient u y']);
    const only = columnNeeds({ dimension: 1, needsTime: false, definition: define(['H1']) });
    expect([...choiceFaults(only, { ...chosen, 'value u': noColumn, 'gradient u x': noColumn }).keys()]).toEqual(['value u']);
  });
});

describe('the mapping', () => {
  const from = (needs: typeof plain, choices: Record<string, string>, kept: Parameters<typeof mappingOf>[1]['kept'] = null, table = {}) => mappingOf(needs, { choices, kept, table });

  it('is what the choices come to once everything is chosen, with what was mapped besides', () => {
    expect(from(plain, { ...chosen, weight: '' })).toBeNull();
    expect(from(plain, { ...chosen, distance: 'wall' }, { x: 'a', weight: 'w', t: 'time', fields: { p: 'P', u: ['V', 'a', 'b'] } }))
      .toEqual({ x: 'x', y: 'y', t: 'time', weight: null, distance: 'wall', fields: { p: 'P', u: ['U', 'a', 'b'] } });
  });

  it('has the gradient after the field, or alone, or not at all', () => {
    const gradient = { 'gradient u x': 'u_x', 'gradient u y': 'u_y' };
    expect(from(graded, { ...chosen, ...gradient })?.fields).toEqual({ u: ['U', 'u_x', 'u_y'] });
    expect(from(graded, { ...chosen, 'gradient u x': noColumn, 'gradient u y': noColumn }, { x: 'x', weight: null, fields: { u: ['U', 'a', 'b'] } })?.fields).toEqual({ u: 'U' });
    const only = columnNeeds({ dimension: 2, needsTime: false, definition: define(['energy']) });
    expect(from(only, { ...chosen, ...gradient, 'value u': noColumn })?.fields).toEqual({ u: ['u_x', 'u_y'] });
  });

  it('says how tables are written only where that was said', () => {
    expect(from(plain, chosen, null, { hasHeader: true })).toMatchObject({ table: { hasHeader: true } });
    expect(from(plain, chosen, { x: 'x', weight: null, fields: {}, table: { hasHeader: true } })?.table).toBeUndefined();
  });
});

describe('the columns offered', () => {
  it('are all of a file, and of very many the chosen one and those alike first', () => {
    expect(offeredColumns(['x', 'u', 'x'], 'u', '')).toEqual(['x', 'u']);
    const many = [...Array.from({ length: 5000 }, (_, index) => `probe ${index}`), 'fields/Pressure', 'weight'];
    const offered = offeredColumns(many, 'pressure', 'weight');
    expect(offered.slice(0, 3)).toEqual(['weight', 'fields/Pressure', 'probe 0']);
    expect(offered).toHaveLength(mostOffered);
  });
});
