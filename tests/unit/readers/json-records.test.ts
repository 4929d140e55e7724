import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { byteSource } from '@/tests/support/byte-source';
import { readReasons, readTable } from '@/tests/support/read-table';

describe('JSON as records', () => {
  it.each([
    ['a list', '[{"x":0,"u":1.5},{"x":1,"u":-2e-3}]'],
    ['a list under a name', '{"run":7,"data":[{"x":0,"u":1.5},{"x":1,"u":-2e-3}],"ok":true}'],
    ['names in any order, and some beside them', '[{"x":0,"note":"a","u":1.5},{"u":-2e-3,"x":1,"more":[{"u":9}],"note":null}]'],
    ['the list that has the names, among others', '{"meshes":[{"file":"a"}],"rows":[{"x":0,"u":1.5},{"x":1,"u":-2e-3}],"later":[{"x":5,"u":5}]}'],
    ['objects in objects', '[{"point":{"x":0},"fields":{"u":1.5}},{"point":{"x":1},"fields":{"u":-2e-3}}]'],
  ])('is read as %s', async (_, content) => {
    expect((await readTable(content, ['x', 'u'])).columns).toEqual([[0, 1], [1.5, -2e-3]]);
  });

  it('names what lies in lists by its place', async () => {
    expect((await readTable('[{"p":[1,2],"U":{"v":[3]}},{"p":[4,5],"U":{"v":[6]}}]', ['p[1]', 'U.v[0]'])).columns).toEqual([[2, 5], [3, 6]]);
  });

  it('gives lines to rows where the document has them, and significant digits', async () => {
    expect(await readTable('[\n{"x":0.125},\n{"x":10}\n]', ['x'])).toMatchObject({ lines: [2, 3], digits: [3] });
    expect((await readTable('[{"x":0.125},{"x":10}]', ['x'])).lines).toEqual([null, null]);
  });

  it('is the same wherever the bytes are cut, and over many batches', async () => {
    const rows = Array.from({ length: 5000 }, (_, i) => ({ x: i / 7, u: Math.sin(i) }));
    const bytes = Buffer.from(JSON.stringify(rows));
    await fc.assert(fc.asyncProperty(fc.array(fc.nat(bytes.length - 1), { maxLength: 30 }), async (cuts) => {
      const { columns } = await readTable(bytes, ['u', 'x'], cuts);
      expect(columns).toEqual([rows.map(({ u }) => u), rows.map(({ x }) => x)]);
    }), { numRuns: 8 });
  });

  it('rejects with row and line what is missing, twice, no number or no record', async () => {
    expect(await readReasons('[{"x":0,"u":1},\n{"x":1},\n{"x":"2","u":NaN},\n{"x":3,"u":3,"u":4}, 7, [1]]', ['x', 'u'])).toEqual([
      { code: 'missing-value', count: 1, line: 2, column: 2, found: 'no u in row 2', expected: 'a number' },
      { code: 'not-a-number', count: 1, line: 3, column: 1, found: '"2" in row 3', expected: 'a number without quotes' },
      { code: 'not-finite', count: 1, line: 3, column: 2, found: 'NaN in row 3', expected: 'a finite number' },
      { code: 'duplicate-column', count: 1, line: 4, column: null, found: 'row 4', expected: 'one u' },
      { code: 'not-a-number', count: 2, line: 4, column: null, found: 'something else than a record in row 5', expected: 'a record with the names of the first' },
    ]);
  });

  it.each([
    ['a name in no record', '[{"x":0},{"x":1}]', 'column-missing'],
    ['a name only in later records', '[{"x":0},{"x":1,"u":2}]', 'column-missing'],
    ['an object where a number is wanted', '[{"x":0,"u":{"a":1}}]', 'column-missing'],
    ['a name twice in the first record', '[{"x":0,"u":1,"u":2}]', 'duplicate-column'],
    ['empty records', '[{},{}]', 'column-missing'],
    ['an end within a record', '[{"x":0,"u":1},{"x":', 'malformed-json'],
    ['an end within the list', '[{"x":0,"u":1},', 'malformed-json'],
    ['records that never have the same names', `[{"x":0,"u":1}${Array.from({ length: 100_001 }, (_, i) => `,{"n${i}":{"a":0}}`).join('')}]`, 'too-many-columns'],
    ['lists too deep', `[{"x":${'['.repeat(1e6)}`, 'malformed-json'],
  ])('with %s is rejected as that', async (_, content, code) => {
    expect((await readReasons(content, ['x', 'u'])).map((reason) => reason.code)).toContain(code);
  });

  it('shows the names of the first record and the first rows, of the longest list', async () => {
    const rows = Array.from({ length: 30 }, (_, i) => ({ at: { x: i }, u: `${i}` }));
    const preview = await readPreview(byteSource(JSON.stringify({ meta: [{ a: 1 }], rows })));
    expect(preview).toMatchObject({ format: 'json', header: ['at.x', 'u'], firstRows: { length: 10 } });
    expect(preview.firstRows[9]).toEqual(['9', '9']);
  });
});
