import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createProblemContract } from '@/lib/domain/problems/schema';
import { requestRecheckContract, listRechecksContract } from '@/lib/domain/studies/recheck-schema';
import { createStudyContract, getGridResultContract, getStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
let caseSlug: string;
const steps = [5, 10, 20, 40];

/** u_t = u_xx on 50 points to t = 1/2, each mode of the start advanced in closed form by the θ scheme in `n` steps. */
function heat(n: number, theta: number, points = 50): Buffer {
  const dt = 0.5 / n;
  const factor = (rate: number) => ((1 - (1 - theta) * rate * dt) / (1 + theta * rate * dt)) ** n;
  const rows = Array.from({ length: points }, (_, i) => {
    const x = (i + 0.5) / points;
    return [x, 1 / points, factor(Math.PI ** 2 / 4) * Math.sin(Math.PI * x / 2) + 0.5 * factor(0.5) * Math.cos(x)].join(',');
  });
  return Buffer.from(`${['x,w,u', ...rows].join('\n')}\n`);
}

beforeAll(async () => {
  engineer = await signUp('Successive');
  work = await makeWork(engineer);
  const problem = await ok(engineer, createProblemContract, { body: { name: 'Cooling of a bar', equation: 'heat', dimension: 1, unsteady: false } });
  const made = await ok(engineer, createCaseContract, { body: {
    code: work.code.slug, problem: problem.slug, name: 'Time step alone', kind: 'order', fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder: 2 }, { norm: 'Linf', formalOrder: 2 }] }],
  } });
  caseSlug = made.slug;
});

async function study(theta: number, sent = steps) {
  const made = await ok(engineer, createStudyContract, { body: { case: caseSlug, release: '1.0.0', refinement: 'time', grids: steps.map((n) => ({ label: `s${n}`, dt: 0.5 / n })) } });
  for (const n of sent) await putFile(engineer, { id: made.id, label: `s${n}` }, heat(n, theta));
  return made.id;
}

describe('a study of time steps without an exact solution', () => {
  it('passes the trapezoidal rule by what successive solutions differ by, and is found again', async () => {
    const id = await study(0.5);
    const { outcome, assessment } = await awaitOutcome(engineer, id);
    expect(outcome).toBe('pass');
    expect(assessment.fields[0]).toMatchObject({ field: 'u', norm: 'L2', comparedTo: { label: 's5', h: 0.1 }, grids: [{ label: 's40' }, { label: 's20' }, { label: 's10' }] });
    for (const { order } of assessment.fields[0]?.orders ?? []) expect(order).toBeCloseTo(2, 1);
    const result = await ok(engineer, getGridResultContract, { params: { id, label: 's40' } });
    expect(result.fields).toEqual([]);
    expect(result.solutions).toMatchObject([{ field: 'u', count: 50 }]);
    const recheck = await ok(engineer, requestRecheckContract, { params: { id } });
    await expect.poll(async () => (await ok(engineer, listRechecksContract, { params: { id } })).items.find((item) => item.id === recheck.id)?.result, { timeout: 20_000 }).toBe('identical');
  });

  it('fails backward Euler against a claim of second order', async () => {
    const { outcome, assessment } = await awaitOutcome(engineer, await study(1));
    expect([outcome, assessment.fields[0]?.reasons]).toEqual(['fail', ['below-formal']]);
    for (const { order } of assessment.fields[0]?.orders ?? []) expect(order).toBeCloseTo(1, 0);
  });

  it('cannot be assessed where solutions stand on other points, and says where', async () => {
    const id = await study(0.5, [5, 10, 20]);
    await putFile(engineer, { id, label: 's40' }, heat(40, 0.5, 49));
    await awaitStudy(engineer, id, ({ state }) => state === 'assessment-failed');
    expect((await ok(engineer, getStudyContract, { params: { id } })).failure).toContain('Grids s40 and s20 cannot be compared. Line 2: found x = 0.0102');
  });
});
