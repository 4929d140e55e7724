import { describe, expect, it } from 'vitest';
import { readDifference } from '@/lib/readers/read-difference';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { byteSource } from '@/tests/support/byte-source';

const mapping = { x: 'x', weight: 'w', fields: { u: 'u' } };
const reading = { dimension: 1, fields: ['u'], fine: mapping, coarse: { ...mapping, weight: null } } as const;
const read = (fine: string, coarse: string) => readDifference({ fine: byteSource(fine), coarse: byteSource(coarse) }, reading);

async function reasonsOf(work: Promise<unknown>) {
  const error: unknown = await work.then(() => null, (fault: unknown) => fault);
  if (!(error instanceof RejectedFile)) throw error;
  return error.reasons;
}

describe('readDifference({fine, coarse}, reading)', () => {
  it('gives the norms of fine minus coarse by the weights of the fine file', async () => {
    const { fields, sha256 } = await read('x,w,u\n0,1,2\n1,3,5\n', 'u,x,w\n1,0,9\n3,1,9\n');
    expect(fields).toMatchObject([{ field: 'u', L1: (1 + 3 * 2) / 4, L2: Math.sqrt((1 + 3 * 4) / 4), Linf: 2, at: { x: 1 }, mean: 7 / 4 }]);
    expect(sha256.fine).not.toBe(sha256.coarse);
  });

  it('goes on over batches and blocks', async () => {
    const rows = 20_001;
    const table = (shift: number) => `x,w,u\n${Array.from({ length: rows }, (_, i) => `${i},1,${i * 0.5 + shift}`).join('\n')}\n`;
    const { fields } = await read(table(0.25), table(0));
    expect(fields).toMatchObject([{ L1: 0.25, L2: 0.25, Linf: 0.25, count: rows }]);
  });

  it('takes points printed with other digits, and refuses others with the line', async () => {
    expect((await read('x,w,u\n0,1,2\n1,1,2\n', 'x,w,u\n0,1,2\n1.00000001,1,2\n')).fields[0]?.Linf).toBe(0);
    expect(await reasonsOf(read('x,w,u\n0,1,2\n1,1,2\n', 'x,w,u\n0,1,2\n1.001,1,2\n'))).toMatchObject([
      { code: 'points-differ', line: 3, found: 'x = 1 in row 2', expected: 'x = 1.001, as on the coarser grid' },
    ]);
  });

  it('refuses files of different lengths', async () => {
    expect(await reasonsOf(read('x,w,u\n0,1,2\n1,1,2\n', 'x,w,u\n0,1,2\n'))).toMatchObject([{ code: 'points-differ', found: '2 rows', expected: '1 rows, as on the coarser grid' }]);
    expect(await reasonsOf(read('x,w,u\n0,1,2\n', 'x,w,u\n0,1,2\n1,1,2\n'))).toMatchObject([{ code: 'points-differ', found: '1 rows' }]);
  });

  it('refuses what the reading of one file would', async () => {
    expect(await reasonsOf(read('x,w,u\n0,1,two\n', 'x,w,u\n0,1,2\n'))).toMatchObject([{ code: 'not-a-number', line: 2, column: 3 }]);
  });
});
