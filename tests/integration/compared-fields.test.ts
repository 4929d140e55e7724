import { beforeAll, describe, expect, it } from 'vitest';
import { wholeFields } from '@/lib/domain/assessment/whole-fields';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createStudyContract, getGridResultContract } from '@/lib/domain/studies/schema';
import { ok, refused } from '@/tests/support/api';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
beforeAll(async () => {
  engineer = await signUp('Compared Works');
  work = await makeWork(engineer);
});

const sizes = [8, 16, 32, 64];
const second = (norm: 'L2' | 'Linf' | 'H1', formalOrder = 2) => ({ norm, formalOrder });

/** T off by a constant and by 0.3·h², its gradient by h, its flux by h². */
function table(n: number): Buffer {
  const h = 1 / n;
  const rows = Array.from({ length: n * n }, (_, i) => {
    const [x, y] = [((i % n) + 0.5) * h, (Math.floor(i / n) + 0.5) * h];
    const [s, c] = [Math.sin(Math.PI * x), Math.cos(Math.PI * x)];
    const [sy, cy] = [Math.sin(Math.PI * y), Math.cos(Math.PI * y)];
    return [x, y, h * h, s * sy + 0.5 * x + 7 + 0.3 * h * h * c, Math.PI * c * sy + 0.5 + h * s, Math.PI * s * cy - h * c, -0.5 * (Math.PI * c * sy + 0.5) + h * h * sy].join(',');
  });
  return Buffer.from(`${['x,y,w,T,T_x,T_y,flux', ...rows].join('\n')}\n`);
}

describe('a study of files with gradients, compared fields and a free constant', () => {
  it('is judged by norms of each', async () => {
    const made = await ok(engineer, createCaseContract, { body: {
      code: work.code.slug, problem: work.problem.slug, name: 'Heat, with gradients', kind: 'order', sampling: 'quadrature',
      fields: [{ field: 'T', datum: 'mean', norms: [second('L2'), second('Linf'), second('H1', 1)] }, { field: 'flux', compare: '-k*d(T, x)', norms: [second('L2')] }],
      gridPlan: sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })),
    } });
    const study = await ok(engineer, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids: made.gridPlan } });
    for (const n of sizes) await putFile(engineer, { id: study.id, label: `n${n}` }, table(n));
    const { outcome, assessment } = await awaitOutcome(engineer, study.id);
    expect(wholeFields(assessment.fields).map(({ field, norm, outcome: of }) => [field, norm, of])).toEqual([['T', 'L2', 'pass'], ['T', 'Linf', 'pass'], ['T', 'H1', 'pass'], ['flux', 'L2', 'pass']]);
    expect(outcome).toBe('pass');
    const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n64' } });
    expect(result.fields[0]).toMatchObject({ field: 'T', datum: { kind: 'mean', value: expect.closeTo(7, 6) as number } });
    expect(result.fields.map(({ field }) => field)).toEqual(['T', 'flux']);
    expect(result.gradients).toMatchObject([{ field: 'T', H1: expect.closeTo(1 / 64, 3) as number }]);
    expect(result.mapping.fields.T).toEqual(['T', 'T_x', 'T_y']);
  });

  it('compares cell averages with averages, and rejects a file that does not tell the size of its cells', async () => {
    const made = await ok(engineer, createCaseContract, { body: {
      code: work.code.slug, problem: work.problem.slug, name: 'Heat, cell averages', kind: 'order', sampling: 'average',
      fields: [{ field: 'T', norms: [second('L2')] }],
    } });
    const study = await ok(engineer, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids: [{ label: 'n8', cellsPerDirection: 8 }, { label: 'n16', cells: 256 }] } });
    const mean = (i: number, n: number) => (n / Math.PI) * (Math.cos((Math.PI * i) / n) - Math.cos((Math.PI * (i + 1)) / n));
    const averages = (n: number) => Buffer.from(`${['x,y,w,T', ...Array.from({ length: n * n }, (_, at) => {
      const [i, j] = [at % n, Math.floor(at / n)];
      return [(i + 0.5) / n, (j + 0.5) / n, n ** -2, mean(i, n) * mean(j, n) + (0.5 * (i + 0.5)) / n].join(',');
    })].join('\n')}\n`);
    await putFile(engineer, { id: study.id, label: 'n8' }, averages(8));
    await putFile(engineer, { id: study.id, label: 'n16' }, averages(16));
    const { grids } = await awaitStudy(engineer, study.id, (found) => found.grids.every(({ state }) => state === 'read' || state === 'rejected'));
    expect(grids.find(({ label }) => label === 'n16')?.upload?.reasons).toMatchObject([{ code: 'column-missing' }]);
    const { fields } = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    expect(fields[0]?.L2).toBeLessThan(1e-6);
  });

  it('answers 422 naming the character of a comparison that cannot be read', async () => {
    const body = { code: work.code.slug, problem: work.problem.slug, name: 'Odd', kind: 'order', fields: [{ field: 'flux', compare: '2T', norms: [{ norm: 'L2' }] }] } as const;
    expect(await refused(engineer, createCaseContract, { body })).toMatchObject({ status: 422, errors: [{ path: 'fields.0.compare' }] });
  });
});
