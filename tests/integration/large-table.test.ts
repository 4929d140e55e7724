import { describe, expect, it } from 'vitest';
import { createStudyContract, getGridResultContract, type Study } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { heatTable } from '@/tests/support/grids';
import { signUp } from '@/tests/support/people';
import { awaitStudy, putFile } from '@/tests/support/study';
import { makeWork } from '@/tests/support/work';

const cells = 400;

describe('a table large enough for a second thread', () => {
  it('is read to its last row, and its norms are those put in', async () => {
    const engineer = await signUp('Large tables');
    const work = await makeWork(engineer);
    const study: Study = await ok(engineer, createStudyContract, {
      body: { case: work.case.slug, release: '1.0.0', grids: [200, cells, 800].map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
    });
    await putFile(engineer, { id: study.id, label: `n${cells}` }, heatTable(cells));
    await awaitStudy(engineer, study.id, ({ grids }) => grids.some(({ state }) => state === 'read' || state === 'rejected'));
    const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: `n${cells}` } });
    expect(result).toMatchObject({ rows: cells ** 2, equalWeights: false });
    expect(result.weightSum).toBeCloseTo(1, 13);
    // Over cell centres the mean of 1 + sin(πx)/2 is 1 + 1/(2n·sin(π/2n)).
    const mean = 1 + 1 / (2 * cells * Math.sin(Math.PI / 2 / cells));
    expect((result.fields[0]?.L1 ?? 0) / ((0.3 / cells ** 2) * mean)).toBeCloseTo(1, 9);
  });
});
