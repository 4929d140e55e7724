import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createProblemContract } from '@/lib/domain/problems/schema';
import { getGridMapContract } from '@/lib/domain/studies/map-schema';
import { createStudyContract, getGridResultContract, getOutcomeXmlContract, reviseStudyContract, updateGridContract, type Study } from '@/lib/domain/studies/schema';
import { ifMatch, ok, refused, send } from '@/tests/support/api';
import { heatSizes, heatTable } from '@/tests/support/grids';
import { outflowProblem, outflowTable } from '@/tests/support/outflow';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';
import { makeWork, orderCase, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
let study: Study;
const stretched = (h: number) => 0.3 * h * h;

beforeAll(async () => {
  engineer = await signUp('Mapped Works');
  work = await makeWork(engineer);
  const made = await ok(engineer, createCaseContract, { body: { ...orderCase, name: 'Heat, with a band', code: work.code.slug, problem: work.problem.slug, boundaryBand: { thickness: 0.25 } } });
  study = await ok(engineer, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids: made.gridPlan } });
  for (const n of heatSizes) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n, { error: stretched }));
  await awaitOutcome(engineer, study.id);
});

const map = (label: string, query: { plane?: 'x' | 'xy' | 'xz'; revision?: number } = {}, id = study.id, field = 'T') => ({ params: { id, label, field }, query });

describe('GET /api/v1/studies/{id}/grids/{label}/result', () => {
  it('has norms of the parts of the domain and says which maps there are', async () => {
    const { regions, maps } = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    // Of 8 by 8 cells 16 lie farther than two from every side, and farther than a quarter too.
    expect(regions.map(({ region, rows }) => [region, rows])).toEqual([['interior-2h', 16], ['boundary-2h', 48], ['interior-fixed', 16], ['boundary-fixed', 48]]);
    // The error is 0.3 h² (1 + sin(πx)/2), by the columns of cells that lie inside.
    const inside = [2, 3, 4, 5].map((i) => stretched(1 / 8) * (1 + 0.5 * Math.sin((Math.PI * (i + 0.5)) / 8)));
    expect(regions[0]?.fields[0]?.L1).toBeCloseTo(inside.reduce((sum, error) => sum + error, 0) / 4, 12);
    expect(regions[0]?.fields[0]?.Linf).toBeCloseTo(Math.max(...inside), 12);
    expect(maps).toEqual([{ field: 'T', plane: 'xy', width: 8, height: 8, bounds: { x: [0, 1], y: [0, 1] }, largest: expect.closeTo(Math.max(...inside), 9) as number }]);
  });
});

describe('GET /api/v1/studies/{id}/outcome', () => {
  it('shows the norms of parts after those of the whole, and judges the whole alone', async () => {
    const { outcome, assessment } = await awaitOutcome(engineer, study.id);
    expect(outcome).toBe('pass');
    expect(assessment.fields.map(({ region, norm }) => `${region} ${norm}`)).toEqual(
      ['all', 'interior-2h', 'boundary-2h', 'interior-fixed', 'boundary-fixed'].flatMap((region) => [`${region} L2`, `${region} Linf`]),
    );
    for (const part of assessment.fields.slice(2)) expect(part).toMatchObject({ outcome: null, reasons: [], counts: false, orders: expect.arrayContaining([expect.objectContaining({ order: expect.closeTo(2, 0) as number })]) as [] });
    const junit = await send(engineer, getOutcomeXmlContract, { params: { id: study.id } });
    expect(junit.text.match(/<testcase /g)).toHaveLength(2);
  });
});

describe('GET /api/v1/studies/{id}/grids/{label}/maps/{field}', () => {
  it('gives the largest error of every bin, from the lowest row on', async () => {
    const { rows, ...about } = await ok(engineer, getGridMapContract, map('n16'));
    expect(about).toMatchObject({ label: 'n16', field: 'T', plane: 'xy', width: 16, height: 16, bounds: { x: [0, 1], y: [0, 1] } });
    rows.forEach((row) => row.forEach((value, i) => {
      const error = stretched(1 / 16) * (1 + 0.5 * Math.sin((Math.PI * (i + 0.5)) / 16));
      expect(Math.abs((value ?? NaN) / error - 1)).toBeLessThan(6e-4);
    }));
  });

  it('answers 404 for another organisation’s study, another field or plane, and a grid that is not read', async () => {
    const stranger = await signUp('Map Strangers');
    expect((await refused(stranger, getGridMapContract, map('n16'))).status).toBe(404);
    expect(await refused(engineer, getGridMapContract, map('n16', { plane: 'xz' }))).toMatchObject({ status: 404, detail: 'Grid n16 has no map of T in the plane xz.' });
    expect((await refused(engineer, getGridMapContract, map('n16', {}, study.id, 'U'))).status).toBe(404);
    expect((await refused(engineer, getGridMapContract, map('n99'))).status).toBe(404);
  });

  it('goes with the file into the next revision, and is made anew where the grid states another spacing', async () => {
    const revised = await ok(engineer, reviseStudyContract, { params: { id: study.id } });
    const { rows } = await ok(engineer, getGridMapContract, map('n8'));
    expect(rows).toHaveLength(8);
    const revision = revised.grids.find(({ label }) => label === 'n8')?.revision ?? 0;
    await ok(engineer, updateGridContract, { params: { id: study.id, label: 'n8' }, body: { cellsPerDirection: 4 }, ...ifMatch(revision) });
    await awaitStudy(engineer, study.id, ({ state }) => state === 'assessed');
    expect((await ok(engineer, getGridMapContract, map('n8'))).rows).toHaveLength(4);
    expect((await ok(engineer, getGridMapContract, map('n8', { revision: 1 }))).rows).toHaveLength(8);
    const { regions } = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    expect(regions.map(({ region }) => region)).toEqual(['boundary-2h', 'interior-fixed', 'boundary-fixed']);
  });
});

describe('a first-order closure at the outflow', () => {
  it('is hinted at by the orders along the boundary and inside', async () => {
    const problem = await ok(engineer, createProblemContract, { body: { name: 'Outflow', ...outflowProblem } });
    const sizes = [40, 80, 160, 320];
    const made = await ok(engineer, createCaseContract, { body: {
      code: work.code.slug, problem: problem.slug, name: 'Outflow', kind: 'order', sampling: 'point',
      fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder: 2 }, { norm: 'Linf', formalOrder: 2 }] }], gridPlan: sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })),
    } });
    const { id } = await ok(engineer, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids: made.gridPlan } });
    for (const n of sizes) await putFile(engineer, { id, label: `n${n}` }, outflowTable(n));
    const { outcome, assessment } = await awaitOutcome(engineer, id);
    expect(outcome).not.toBe('pass');
    expect(assessment.patterns).toEqual([expect.objectContaining({ code: 'boundary-closure', field: 'u', evidence: expect.objectContaining({ boundaryOrder: expect.closeTo(1, 1) as number, interiorOrder: expect.closeTo(2, 1) as number }) as object })]);
    const { plane, height, rows } = await ok(engineer, getGridMapContract, map('n40', {}, id, 'u'));
    expect([plane, height, rows.length]).toEqual(['x', 1, 1]);
    expect(rows[0]?.indexOf(Math.max(...(rows[0] ?? []).map((value) => value ?? 0)))).toBe(39);
  });
});
