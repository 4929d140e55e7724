import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createStudyContract, getGridResultContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { edges, tensorCells } from '@/tests/support/mesh';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, putFile } from '@/tests/support/study';
import { heatProblem, makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
beforeAll(async () => {
  engineer = await signUp('Similar Works');
  work = await makeWork(engineer);
});

/** The exact field off by 1/n², on cells that halve in x < 1/2 and stay as they are beyond; the first row comes twice. */
function table(n: number): { rows: number; bytes: Buffer } {
  const { centres, volumes } = tensorCells([...edges(n / 2, (s) => s / 2), ...edges(4, (s) => 0.5 + s / 2).slice(1)], edges(n));
  const lines = centres.map(([x = 0, y = 0], at) => [x, y, volumes[at], Math.sin(Math.PI * x) * Math.sin(Math.PI * y) + heatProblem.constants.k * x + (1 / n / n) * Math.cos(x)].join(','));
  return { rows: lines.length + 1, bytes: Buffer.from(`${['x,y,w,T', lines[0], ...lines].join('\n')}\n`) };
}

describe('a study on grids refined in part of the domain', () => {
  it('does not pass, says by which figures, and counts rows that come twice', async () => {
    const tables = [8, 16, 32, 64].map((n) => ({ label: `n${n}`, ...table(n) }));
    const made = await ok(engineer, createCaseContract, { body: {
      code: work.code.slug, problem: work.problem.slug, name: 'Heat, refined in part', kind: 'order', sampling: 'point',
      fields: [{ field: 'T', norms: [{ norm: 'L2', formalOrder: 2, tolerance: 0.1 }] }],
    } });
    const study = await ok(engineer, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids: tables.map(({ label, rows }) => ({ label, cells: rows })) } });
    for (const { label, bytes } of tables) await putFile(engineer, { id: study.id, label }, bytes);
    const { assessment } = await awaitOutcome(engineer, study.id);
    expect(assessment.similarity).toMatchObject({ isSimilar: false, pairs: [{ coarse: 'n32', fine: 'n64', isAlike: false }, { coarse: 'n16', fine: 'n32', isAlike: false }] });
    expect(assessment.inputs.map(({ mesh }) => mesh?.duplicates)).toEqual(tables.map(() => ({ rows: 1, oneIn: 1 })));
    const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    expect(result.mesh).toMatchObject({ duplicates: { rows: 1, oneIn: 1 }, low: [1 / 16, 1 / 16] });
  });
});
