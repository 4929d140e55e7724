import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readReasons, readTable } from '@/tests/support/read-table';

describe('JSON as columns of arrays', () => {
  it.each([
    ['an object of arrays', '{"x":[0,1,2],"u":[1.5,-2e-3,0]}'],
    ['arrays under “columns”', '{"columns": {"u": [1.5,-2e-3,0], "x": [0,1,2]}}'],
    ['other things beside them', '{"name":"a \\"b\\" [","meta":{"x":[9],"deep":[[1],{"u":[2]}]},"n":3,"x":[0,1,2],"ok":true,"none":null,"u":[1.5,-2e-3,0]}'],
    ['white space and escapes', ' {\r\n "\\u0078" : [ 0 , 1 ,\n 2 ] ,\t"u":[1.5,-2e-3,0]}\n'],
    ['paths as names', '{"mesh/x":[0,1,2],"fields.u":[1.5,-2e-3,0]}'],
  ])('is read as %s', async (_, content) => {
    expect((await readTable(content, ['x', 'u'])).columns).toEqual([[0, 1, 2], [1.5, -2e-3, 0]]);
  });

  it('is the same wherever the bytes are cut', async () => {
    const doubles = fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }).map((value) => value + 0), { minLength: 1, maxLength: 20 });
    await fc.assert(fc.asyncProperty(doubles, fc.string(), fc.array(fc.nat(5000)), async (values, note, cuts) => {
      const bytes = Buffer.from(JSON.stringify({ note, x: values, u: values.map((value) => -value + 0) }, null, 1));
      const { columns } = await readTable(bytes, ['x', 'u'], cuts.map((cut) => cut % bytes.length));
      expect(columns).toEqual([values, values.map((value) => -value + 0)]);
    }), { numRuns: 150 });
  });

  it('is read as a solver wrote it, to the row', async () => {
    const content = JSON.stringify({ x: Array.from({ length: 70_000 }, (_, i) => i / 7) });
    expect((await readTable(content, ['x'])).columns[0]?.[69_999]).toBe(69_999 / 7);
  });

  it('lists what is not a number, with line, column and row', async () => {
    expect(await readReasons('{"x":[0,1,2],\n"u":[1,NaN,null],\n"v":["1",[2],Infinity]}', ['x', 'u', 'v'])).toEqual([
      { code: 'not-finite', count: 1, line: 2, column: 2, found: 'NaN in row 2', expected: 'a finite number' },
      { code: 'missing-value', count: 1, line: 2, column: 2, found: 'null in row 3', expected: 'a number' },
      { code: 'not-a-number', count: 2, line: 3, column: 3, found: '"1" in row 1', expected: 'a number without quotes' },
      { code: 'not-finite', count: 1, line: 3, column: 3, found: 'Infinity in row 3', expected: 'a finite number' },
    ]);
  });

  it.each([
    ['columns of unequal length', '{"x":[0,1],"u":[1]}', 'column-length'],
    ['an absent column', '{"x":[0,1]}', 'column-missing'],
    ['a column twice', '{"x":[0],"u":[1],"u":[2]}', 'duplicate-column'],
    ['no rows', '{"x":[],"u":[]}', 'too-few-rows'],
    ['a list of numbers', '[1,2]', 'unsupported-format'],
    ['a list of lists', '[[0,1]]', 'unsupported-format'],
    ['an end too early', '{"x":[0,1],"u":[1,', 'malformed-json'],
    ['a comma too many', '{"x":[0,1,],"u":[1,2]}', 'malformed-json'],
    ['something after the end', '{"x":[0],"u":[1]} 2', 'malformed-json'],
    ['a word', '{"x":[zero],"u":[1]}', 'malformed-json'],
    ['an endless name', `{"${'x'.repeat(100_000)}`, 'malformed-json'],
  ])('with %s is rejected as that', async (_, content, code) => {
    expect((await readReasons(content, ['x', 'u'])).map((reason) => reason.code)).toEqual([code]);
  });

  it('names the line of what is out of place', async () => {
    expect(await readReasons('{\n"x": [0,\n1;2]}', ['x'])).toEqual([
      { code: 'malformed-json', count: 1, line: 3, column: null, found: '“;”', expected: '“,” or the end of the list' },
    ]);
  });
});

describe('the files of broken/', () => {
  interface Broken { file: string; line: number | null; column: number | null; expected: string }
  const folder = 'fixtures/solver-output/broken';
  const cases = JSON.parse(readFileSync(`${folder}/broken.json`, 'utf8')) as Broken[];
  const codes: Record<string, string> = {
    'truncated_row.csv': 'short-row', 'nan_value.csv': 'not-finite', 'text_in_number.csv': 'not-a-number',
    'missing_column.csv': 'column-missing', 'empty.csv': 'empty-file', 'mixed_decimal_comma.csv': 'mixed-decimal',
  };

  it.each(cases)('$file: $expected', async ({ file, line, column }) => {
    const reasons = await readReasons(readFileSync(`${folder}/${file}`), ['x', 'y', 'w', 'u']);
    expect(reasons).toHaveLength(1);
    expect(reasons[0]).toMatchObject({ code: codes[file], line, ...(column !== null && { column }) });
    if (file === 'missing_column.csv') expect(reasons[0]).toMatchObject({ found: 'x, y, u', expected: 'w' });
  });
});
