import { describe, expect, it } from 'vitest';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { readPreview } from '@/lib/readers/read-preview';
import { RejectedFile } from '@/lib/readers/rejected-file';

const gigabyte = 2 ** 30;
const reading: GridReading = {
  mapping: { x: 'x', weight: null, fields: { u: 'u' } }, problem: { dimension: 1, exact: { u: 'x' }, constants: {} }, fields: [{ field: 'u' }],
};

/** A beginning, then one piece over and over, up to so many bytes; how much of it was taken. */
function endless(start: string, piece: string, bytes: number) {
  const repeated = Buffer.alloc(2 ** 16, piece);
  let taken = 0;
  async function* source(): AsyncGenerator<Uint8Array> {
    yield Buffer.from(start);
    for (; taken < bytes; taken += repeated.length) yield await Promise.resolve(repeated);
  }
  return { source: source(), taken: () => taken };
}

async function reasonsOf(work: Promise<unknown>) {
  const error: unknown = await work.then(() => null, (fault: unknown) => fault);
  if (!(error instanceof RejectedFile)) throw error instanceof Error ? error : new Error('It was taken.');
  return error.reasons;
}

describe('a file of two gigabytes', () => {
  it.each([
    ['in one line from its beginning', '', '1', 'line-too-long', 1],
    ['of lists inside each other', '{"note":', '[', 'malformed-json', 1],
    ['of one JSON text', '{"x":["', 'a', 'malformed-json', 1],
    ['of one JSON number', '{"x":[', '1', 'malformed-json', 1],
    ['of one XML tag', '<VTKFile type="UnstructuredGrid" ', 'a', null, null],
  ])('%s is refused after a few megabytes', async (_, start, piece, code, line) => {
    for (const read of [(source: AsyncIterable<Uint8Array>) => readGrid(source, reading), readPreview]) {
      const { source, taken } = endless(start, piece, 2 * gigabyte);
      const reasons = await reasonsOf(read(source));
      expect(taken()).toBeLessThan(16 * 2 ** 20);
      if (code !== null) expect(reasons).toMatchObject([{ code, line }]);
    }
  });

  it.each([['digits', '1'], ['separators', ',']])('in one line of %s behind others is refused with its number', async (_, piece) => {
    const { source, taken } = endless('x,u\n0,1\n', piece, 2 * gigabyte);
    expect(await reasonsOf(readGrid(source, reading))).toMatchObject([{ code: 'line-too-long', line: 3 }]);
    expect(taken()).toBeLessThan(16 * 2 ** 20);
  });

  it('with null bytes far behind its beginning has each row of them named', async () => {
    const rows = 50_000;
    async function* source(): AsyncGenerator<Uint8Array> {
      yield Buffer.from(`x,u\n${'0.5,0.25\n'.repeat(rows)}`);
      yield await Promise.resolve(Buffer.from('1,2\0\n'));
    }
    expect(await reasonsOf(readGrid(source(), reading))).toMatchObject([{ code: 'not-a-number', count: 1, line: rows + 2, column: 2 }]);
  });
});
