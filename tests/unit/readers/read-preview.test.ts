import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { byteSource } from '@/tests/support/byte-source';

const numbers = Array.from({ length: 20 }, (_, i) => `${i};${i / 2}`).join('\n');

describe('readPreview(source)', () => {
  it('gives header, separator and the first ten rows of a table', async () => {
    const preview = await readPreview(byteSource(`# note\nx;u\n${numbers}\n`));
    expect(preview).toMatchObject({ format: 'table', compressed: false, delimiter: 'semicolon', hasHeader: true, header: ['x', 'u'] });
    expect(preview.firstRows).toHaveLength(10);
    expect(preview.firstRows[3]).toEqual(['3', '1.5']);
  });

  it('names columns c1, c2 … where there is no header, also in a compressed file', async () => {
    const preview = await readPreview(byteSource(gzipSync(numbers)));
    expect(preview).toMatchObject({ compressed: true, hasHeader: false, header: ['c1', 'c2'], firstRows: { length: 10 } });
  });

  it('keeps a column without a name under its number', async () => {
    expect((await readPreview(byteSource('x,,u\n1,2,3\n'))).header).toEqual(['x', 'c2', 'u']);
  });

  it('shows a damaged row as it is', async () => {
    expect((await readPreview(byteSource('x,u\n1,oops\n2\n'))).firstRows).toEqual([['1', 'oops'], ['2']]);
  });

  it('gives the columns of JSON wherever they stand', async () => {
    const content = JSON.stringify({ about: 'run 7', x: [0, 1, null], columns: undefined, u: Array.from({ length: 30_000 }, (_, i) => i) });
    const preview = await readPreview(byteSource(content, [9, 100, 70_000]));
    expect(preview).toMatchObject({ format: 'json', delimiter: null, header: ['x', 'u'], firstRows: { length: 10 } });
    expect(preview.firstRows.slice(1, 4)).toEqual([['1', '1'], ['null', '2'], ['', '3']]);
  });

  it('reads no more of a table than its beginning', async () => {
    let taken = 0;
    async function* endless(): AsyncGenerator<Uint8Array> {
      yield Buffer.from('x,u\n');
      for (;;) {
        taken += 1;
        yield await Promise.resolve(Buffer.from('1,2\n'.repeat(1000)));
      }
    }
    await readPreview(endless());
    expect(taken).toBeLessThan(30);
  });
});
