import fc from 'fast-check';
import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { readReasons, readTable } from '@/tests/support/read-table';

describe('a text table', () => {
  const expected = [[0, 1, 2], [10, -20.5, 3e-7]];
  it.each([
    ['comma', 'x,u\n0,10\n1,-20.5\n2,3e-7\n'],
    ['comma with white space', ' x , u\n0, 10\n 1, -20.5\n2 ,3e-7'],
    ['semicolon', 'x;u\n0;10\n1;-20.5\n2;3e-7\n'],
    ['tab', 'x\tu\n0\t10\n1\t-20.5\n2\t3e-7\n'],
    ['white space', '   x      u\n 0   10\n 1\t-20.5  \n 2   3e-7\n'],
    ['CRLF', 'x,u\r\n0,10\r\n1,-20.5\r\n2,3e-7\r\n'],
    ['a byte order mark', '\uFEFFx,u\n0,10\n1,-20.5\n2,3e-7\n'],
    ['comments and blank lines', '# by a solver\n\nx,u\n% first\n0,10\n// second\n\n1,-20.5\n   \n2,3e-7\n\n'],
    ['Fortran exponents', 'x u\n0D0 1.0d+01\n1 -2.05D1\n2 3.0D-007\n'],
    ['a decimal comma and semicolons', 'x;u\n0;10\n1;-20,5\n2;3,0e-7\n'],
    ['a decimal comma and white space', 'x u\n0,0 10,0\n1,0 -20,5\n2,0 3,0e-7\n'],
    ['a decimal comma and tabs', 'x\tu\n0\t10\n1\t-20,5\n2\t3,0e-7\n'],
    ['a comment that names the columns', '# x u\n0 10\n1 -20.5\n2 3e-7\n'],
    ['quotes', '"x","u","a, b"\n"0","10","c, d"\n1,-20.5,"e"\n2,3e-7,f\n'],
    ['nothing but carriage returns to end its lines', 'x,u\r0,10\r1,-20.5\r2,3e-7\r'],
    ['units in brackets', 'x [m],u [m/s]\n0,10\n1,-20.5\n2,3e-7\n'],
    ['units in brackets and white space', 'x [ m ]  flow/u (m s^-1)\n0 10\n1 -20.5\n2 3e-7\n'],
    ['names parted by commas over rows parted by white space', 'x, u\n0 10\n1 -20.5\n2 3e-7\n'],
    ['a comment of several marks and commas that names the columns', '## x, u\n0 10\n1 -20.5\n2 3e-7\n'],
    ['a decimal comma and Fortran exponents', 'x;u\n0,0D0;1,0D+01\n1,0D0;-2,05D1\n2,0D0;3,0D-007\n'],
    ['a name that begins as a netCDF file does', 'CDF,x,u\n0,0,10\n0,1,-20.5\n0,2,3e-7\n'],
    ['a separator at the end of the rows alone', 'x,u\n0,10,\n1,-20.5,\n2,3e-7,\n'],
    ['a separator at the end', 'x,u,\n0,10,\n1,-20.5,\n2,3e-7,\n'],
  ])('is read with %s', async (_, content) => {
    expect((await readTable(content, ['x', 'u'])).columns).toEqual(expected);
  });

  it('names its columns c1, c2 … where it has no header', async () => {
    expect((await readTable('0 10\n1 -20.5\n2 3e-7\n', ['c1', 'c2'])).columns).toEqual(expected);
  });

  it('is unpacked where it begins as gzip does', async () => {
    expect((await readTable(gzipSync('x,u\n0,10\n1,-20.5\n2,3e-7\n'), ['x', 'u'])).columns).toEqual(expected);
  });

  it('is unpacked from several gzip members in one file', async () => {
    const members = [gzipSync('x,u\n0,10\n1,'), gzipSync('-20.5\n2,3e-7\n')];
    expect((await readTable(Buffer.concat(members), ['x', 'u'])).columns).toEqual(expected);
  });

  it('reads a doubled quote as one', async () => {
    expect((await readTable('"x","u ""mean"" of all"\n0,10\n', ['u "mean" of all'])).columns).toEqual([[10]]);
  });

  it('is read with thousands of columns in lines longer than one head', async () => {
    const many = Array.from({ length: 40_000 }, (_, i) => i);
    const content = `${many.map((i) => `probe_${i}`).join(',')},x\n${many.map((i) => `${i}.5`).join(',')},7\n`;
    expect((await readTable(content, ['x', 'probe_39999'])).columns).toEqual([[7], [39_999.5]]);
  });

  it('gives the columns in the order asked for, and only those', async () => {
    expect((await readTable('name,u,x\na,10,0\nb,-20.5,1\nc,3e-7,2\n', ['x', 'u'])).columns).toEqual(expected);
  });

  it('is found by the last part of a path', async () => {
    expect((await readTable('mesh/x,field.u\n0,10\n', ['x', 'u'])).columns).toEqual([[0], [10]]);
  });

  it('counts lines from 1, comments and blank lines too', async () => {
    expect((await readTable('# one\nx,u\n\n0,10\n# five\n1,2\n', ['x'])).lines).toEqual([4, 6]);
  });

  it('counts the significant digits of each column', async () => {
    const { digits } = await readTable('x,u,v\n0.00,12.50,-0.000123\n0.10,1,1.0E+00\n', ['x', 'u', 'v']);
    expect(digits).toEqual([2, 4, 3]);
  });

  it('is the same wherever the bytes are cut, compressed or not', async () => {
    const row = fc.tuple(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.double({ noNaN: true, noDefaultInfinity: true }));
    await fc.assert(fc.asyncProperty(fc.array(row, { minLength: 1, maxLength: 30 }), fc.array(fc.nat(2000)), fc.boolean(), async (rows, cuts, isPacked) => {
      const text = `\uFEFF# é\r\nx,u\r\n${rows.map(([x, u]) => `${x},${u}`).join('\r\n')}`;
      const bytes = isPacked ? gzipSync(text) : Buffer.from(text);
      const { columns } = await readTable(bytes, ['x', 'u'], cuts.map((cut) => cut % bytes.length));
      // The language writes −0 as 0.
      expect(columns).toEqual([rows.map(([x]) => x + 0), rows.map(([, u]) => u + 0)]);
    }), { numRuns: 150 });
  });

  it('is read beyond one batch and one head', async () => {
    const rows = Array.from({ length: 10_000 }, (_, i) => [i, Math.sin(i)] as const);
    const { columns, lines } = await readTable(`x,u\n${rows.map((row) => row.join(',')).join('\n')}\n`, ['x', 'u'], [70_001, 100_000]);
    expect(columns[1]).toEqual(rows.map(([, u]) => u));
    expect(lines.at(-1)).toBe(10_001);
  });
});

describe('a damaged text table', () => {
  it('lists every reason, the first place of each and how often', async () => {
    const content = 'x,u,v\n0,1,1\n1,bad,2\n2,NaN,\n3,worse,inf\n4\n5,1,2,3\n6,1e400,1\n';
    expect(await readReasons(content, ['x', 'u', 'v'])).toEqual([
      { code: 'not-a-number', count: 2, line: 3, column: 2, found: 'bad', expected: 'a finite number' },
      { code: 'not-finite', count: 2, line: 4, column: 2, found: 'NaN', expected: 'a finite number' },
      { code: 'missing-value', count: 1, line: 4, column: 3, found: 'nothing', expected: 'a number' },
      { code: 'not-finite', count: 1, line: 5, column: 3, found: 'inf', expected: 'a finite number' },
      { code: 'short-row', count: 1, line: 6, column: null, found: '1 column', expected: '3 columns' },
      { code: 'long-row', count: 1, line: 7, column: null, found: '4 columns', expected: '3 columns' },
    ]);
  });

  it('names the first twenty kinds of what is wrong, each column one of its own', async () => {
    const names = Array.from({ length: 60 }, (_, i) => `f${i}`);
    const reasons = await readReasons(`${names.join(',')}\n${names.map(() => 'nan').join(',')}\n`, names);
    expect(reasons.map(({ column }) => column)).toEqual(Array.from({ length: 20 }, (_, i) => i + 1));
  });

  it('is not rejected for a column that nobody asked for', async () => {
    expect(await readReasons('x,name\n0,cell\n1,\n', ['x'])).toEqual([]);
  });

  it.each([
    ['nothing', '', 'empty-file'],
    ['only white space', '\n  \n', 'empty-file'],
    ['only comments', '# a\n# b\n', 'empty-file'],
    ['a header alone', 'x,u\n', 'too-few-rows'],
    ['a column twice', 'x,u,u\n0,1,2\n', 'duplicate-column'],
    ['text in UTF-16', Buffer.from('\uFEFFx,u\n0,1\n', 'utf16le'), 'unsupported-format'],
    ['the beginning of HDF5 alone', Buffer.from('\x89HDF\r\n\x1a\n....', 'latin1'), 'damaged-file'],
    ['other XML', '<?xml version="1.0"?>\n<grid type="UnstructuredGrid">', 'unsupported-format'],
    ['null bytes', Buffer.from([120, 0, 1, 2, 10]), 'binary-content'],
    ['a cut gzip file', gzipSync('x,u\n0,1\n1,2\n').subarray(0, 25), 'damaged-gzip'],
    ['a line without end', `x,u\n0,1\n${'1'.repeat(3_000_000)}`, 'line-too-long'],
    ['thousands parted by commas', 'x;u\n0;1,234.5\n', 'not-a-number'],
    ['hexadecimal numbers', 'x,u\n0,0x10\n', 'not-a-number'],
  ])('with %s is rejected as that', async (_, content, code) => {
    expect((await readReasons(content, ['x', 'u'])).map((reason) => reason.code)).toContain(code);
  });

  it('names the missing columns and lists those found', async () => {
    expect(await readReasons('# solver\nx,u\n0,1\n', ['x', 'w', 'v'])).toEqual([
      { code: 'column-missing', count: 2, line: 2, column: null, found: 'x, u', expected: 'w, v' },
    ]);
  });

  it('passes on what goes wrong in the source', async () => {
    async function* failing(): AsyncGenerator<Uint8Array> {
      yield gzipSync('x,u\n0,1\n').subarray(0, 12);
      await Promise.resolve();
      throw new Error('storage went away');
    }
    await expect(readPreview(failing())).rejects.toThrow('storage went away');
  });
});
