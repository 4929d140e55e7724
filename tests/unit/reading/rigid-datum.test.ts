import { describe, expect, it } from 'vitest';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import type { GridNorms } from '@/lib/numerics/norms/grid-norms';
import { readGrid } from '@/lib/readers/read-grid';
import { readNorms } from '@/lib/services/reading/read-norms';
import { byteSource } from '../../support/byte-source';

const problem = problemDefinitionSchema.parse({
  equation: 'none', dimension: 2, exact: { u: '0.1*sin(x)*y', v: '0.2*cos(y) + x' }, domain: { x: [10, 11], y: [0, 1] },
});
const fields = ['u', 'v'].map((field) => ({ field, datum: 'rigid', norms: [{ norm: 'L2' }, { norm: 'H1' }] }));
const definition = caseDefinitionSchema.parse({ fields });

interface Motion { a: number; b: number; turn: number }

/** Cells of a square with the exact displacement, a rigid motion, and an error of h² whose mean and moment are 0. */
function table(n: number, { a, b, turn }: Motion): string {
  const h = 1 / n;
  const rows = Array.from({ length: n * n }, (_, i) => {
    const [x, y] = [10 + ((i % n) + 0.5) * h, (Math.floor(i / n) + 0.5) * h];
    const wave = h * h * Math.cos(2 * Math.PI * x) * Math.cos(2 * Math.PI * y);
    return [
      x, y, h * h, 0.1 * Math.sin(x) * y + a - turn * y + wave, 0.2 * Math.cos(y) + x + b + turn * x - wave,
      0.1 * Math.cos(x) * y + wave, 0.1 * Math.sin(x) - turn, 1 + turn, -0.2 * Math.sin(y) - wave,
    ].join(',');
  });
  return ['x,y,w,u,v,u_x,u_y,v_x,v_y', ...rows].join('\n');
}

async function read(text: string): Promise<GridNorms> {
  const mapping = { x: 'x', y: 'y', weight: 'w', fields: { u: ['u', 'u_x', 'u_y'], v: ['v', 'v_x', 'v_y'] } };
  return (await readNorms({ definition, problem, mapping, grid: {}, seenAs: 2, statedSha256: null }, (reading) => readGrid(byteSource(text), reading))).norms;
}

describe('a displacement known up to a rigid motion', () => {
  const motion = { a: 0.3, b: -2, turn: 0.05 };

  it('has the norms of its error without the best motion, and tells the motion', async () => {
    for (const n of [8, 16, 32]) {
      const { fields: found, motion: removed, gradients } = await read(table(n, motion));
      // The mean square of h²·cos(2πx)·cos(2πy) over centres of cells is h⁴/4.
      for (const each of found) expect(each.L2 * n * n).toBeCloseTo(0.5, 9);
      expect(removed?.rotation[0]).toBeCloseTo(motion.turn, 11);
      expect(removed?.centre[0]).toBeCloseTo(10.5, 12);
      // At the centre (10.5, 0.5): a − turn·y and b + turn·x.
      expect(found[0]?.datum).toEqual({ kind: 'rigid', value: expect.closeTo(0.3 - 0.05 * 0.5, 11) as number });
      expect(found[1]?.datum).toEqual({ kind: 'rigid', value: expect.closeTo(-2 + 0.05 * 10.5, 11) as number });
      for (const { H1 } of gradients ?? []) expect(H1 * n * n).toBeCloseTo(0.5, 9);
    }
  });

  it('has the same norms whatever the motion', async () => {
    const still = await read(table(12, { a: 0, b: 0, turn: 0 }));
    const moved = await read(table(12, { a: 5, b: 1, turn: -0.7 }));
    for (const [i, each] of moved.fields.entries()) for (const norm of ['L1', 'L2', 'Linf'] as const) expect(each[norm]).toBeCloseTo(still.fields[i]?.[norm] ?? NaN, 11);
  });

  it('needs the columns of its components, and not only their gradients', async () => {
    const mapping = { x: 'x', y: 'y', weight: 'w', fields: { u: ['u_x', 'u_y'], v: ['v', 'v_x', 'v_y'] } };
    const reading = readNorms({ definition, problem, mapping, grid: {}, seenAs: 2, statedSha256: null }, (asked) => readGrid(byteSource(table(4, motion)), asked));
    await expect(reading).rejects.toMatchObject({ reasons: [{ code: 'column-missing', expected: 'u' }] });
  });
});
