import { describe, expect, it } from 'vitest';
import { refuseDialect, type GivenDialect } from '@/lib/domain/columns/given-dialect';
import { describeTable } from '@/lib/domain/uploads/dialect-text';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { readPreview } from '@/lib/readers/read-preview';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { byteSource } from '@/tests/support/byte-source';

const preview = (content: string, given?: GivenDialect) => readPreview(byteSource(content), given);
const words = async (content: string, given?: GivenDialect) => {
  const { delimiter, hasHeader, headerLine = null, decimalMark = null } = await preview(content, given);
  return describeTable({ delimiter: delimiter ?? 'white space', hasHeader, headerLine, decimalMark });
};

const reading = (table: GivenDialect, names: { x: string; u: string }): GridReading => ({
  mapping: { x: names.x, weight: null, fields: { u: names.u }, table },
  problem: { dimension: 1, exact: { u: '2*x' }, constants: {} },
  fields: [{ field: 'u' }],
});

async function reasonsOf(content: string, asked: GridReading) {
  try {
    await readGrid(byteSource(content), asked);
    return [];
  } catch (error) {
    if (error instanceof RejectedFile) return error.reasons;
    throw error;
  }
}

describe('the way a table is written, as found out', () => {
  it.each([
    ['# run 7\n# by a solver\nx;u\n0,5;1\n', 'Semicolon between columns, decimal comma, names in line 3'],
    ['x u\n1 2\n', 'White space between columns, names in line 1'],
    ['0.5\t1\n', 'Tab between columns, decimal point, no line of names'],
    // Two numbers or four: without anything else to tell, a comma parts columns.
    ['1,5,2,5\n2,5,4,5\n', 'Comma between columns, no line of names'],
    ['1,5 2,5\n2,5 4,5\n', 'White space between columns, decimal comma, no line of names'],
  ])('%j is: %s', async (content, expected) => {
    expect(await words(content)).toBe(expected);
  });
});

describe('the way a table is written, as given', () => {
  it('takes the separator that was given, and finds out the rest', async () => {
    expect(await preview('a b;u\n0,5;1\n', { delimiter: 'white space' })).toMatchObject({ delimiter: 'white space', header: ['a', 'b;u'], firstRows: [['0,5;1']] });
    expect(await words('x\tu; v\n1\t2; 3\n', { delimiter: 'semicolon' })).toBe('Semicolon between columns, names in line 1');
  });

  it('takes numbers for names where told, and text for a row', async () => {
    expect(await preview('1;2\n0,5;1\n', { hasHeader: true })).toMatchObject({ hasHeader: true, header: ['1', '2'], headerLine: 1, firstRows: [['0,5', '1']] });
    expect(await preview('x;u\n0,5;1\n', { hasHeader: false })).toMatchObject({ hasHeader: false, header: ['c1', 'c2'], firstRows: [['x', 'u'], ['0,5', '1']] });
    expect(await preview('# x u\n0.5 1\n', { hasHeader: true })).toMatchObject({ header: ['x', 'u'], headerLine: 1, firstRows: [['0.5', '1']] });
    expect(await preview('# x u\n0.5 1\n', { hasHeader: false })).toMatchObject({ header: ['c1', 'c2'], firstRows: [['0.5', '1']] });
  });

  it('never takes a comma for a separator that is the decimal mark', async () => {
    expect(await words('1,5\n2,5\n')).toBe('Comma between columns, no line of names');
    expect(await words('1,5\n2,5\n', { decimalMark: 'comma' })).toBe('White space between columns, decimal comma, no line of names');
    expect(refuseDialect({ delimiter: 'comma', decimalMark: 'comma' })).toContain('“1,5,2,5” could be two numbers or four');
    expect(refuseDialect({ delimiter: 'comma', decimalMark: 'point' })).toBeNull();
  });

  it('is what the whole file is read by', async () => {
    const content = '1;2\n0,5;1,5\n1;2\n2;4\n';
    expect(await reasonsOf(content, reading({}, { x: '1', u: '2' }))).toMatchObject([{ code: 'column-missing', found: 'c1, c2' }]);
    const { norms } = await readGrid(byteSource(content), reading({ hasHeader: true, decimalMark: 'comma' }, { x: '1', u: '2' }));
    expect(norms).toMatchObject({ rows: 3, fields: [{ Linf: 0.5, at: { x: 0.5 } }] });
    expect((await readGrid(byteSource(content), reading({ hasHeader: false }, { x: 'c1', u: 'c2' }))).norms.rows).toBe(4);
  });

  it('rejects what is written otherwise, with the place', async () => {
    const names = { x: 'x', u: 'u' };
    expect(await reasonsOf('x;u\n1;2\n0,5;1\n', reading({ decimalMark: 'point' }, names))).toEqual([
      { code: 'mixed-decimal', count: 1, line: 3, column: 1, found: '0,5', expected: 'a decimal point, as said in the columns of the case' },
    ]);
    expect(await reasonsOf('x;u\n1;2\n1;2.5\n1;3.5\n', reading({ decimalMark: 'comma' }, names))).toEqual([
      { code: 'mixed-decimal', count: 2, line: 3, column: 2, found: '2.5', expected: 'a decimal comma, as said in the columns of the case' },
    ]);
    expect(await reasonsOf('x;u\n1;2\n', reading({ hasHeader: false }, { x: 'c1', u: 'c2' }))).toMatchObject([
      { code: 'not-a-number', line: 1, column: 1, found: 'x' }, { code: 'not-a-number', line: 1, column: 2, found: 'u' },
    ]);
    expect(await reasonsOf('x;u\n1;2\n', reading({ delimiter: 'tab' }, names))).toMatchObject([{ code: 'column-missing', line: 1, found: 'x;u', expected: 'x, u', count: 2 }]);
  });
});
