import { beforeAll, expect } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { browserTest, seriousFindings } from '@/tests/support/browser';
import { makeShownWork, type ShownWork } from '@/tests/support/shown-work';
import { awaitOutcome } from '@/tests/support/study';

let work: ShownWork;
let quantities = '';
beforeAll(async () => {
  work = await makeShownWork();
  const made = await ok(work.person, createCaseContract, { body: {
    code: work.code.slug, problem: work.problem.slug, name: 'Forces', kind: 'solution',
    quantities: (['three-grid', 'guarded-order', 'least-squares', 'correction-factor'] as const).map((procedure) => ({ name: procedure.replace('-', ' '), unit: 'N', formalOrder: 2, target: 0.01, procedure, uNumFactor: 1.15 })),
  } });
  const grids = [8, 16, 32, 64, 128].map((n) => ({ label: `n${n}`, cellsPerDirection: n, values: Object.fromEntries(made.quantities.map(({ name }) => [name, 10 + 4 * n ** -1.92])) }));
  const study = await ok(work.person, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids } });
  await awaitOutcome(work.person, study.id);
  quantities = study.id;
});

browserTest('shots', async ({ open }) => {
  const at = `/${work.person.at.slug}`;
  for (const [name, path] of [['st', `${at}/studies/${work.spaceTimeStudy}`], ['q', `${at}/studies/${quantities}`], ['case', `${at}/cases/new`], ['forces', `${at}/cases/forces`]] as const) {
    for (const size of ['wide', 'phone'] as const) {
      const page = await open(path, { person: work.person, size });
      if (name === 'case') {
        await page.getByLabel('Problem').selectOption({ index: 1 });
        await page.getByRole('button', { name: 'Add field T' }).click();
        await page.getByRole('button', { name: 'Add a quantity' }).click();
      }
      await page.waitForTimeout(400);
      await page.screenshot({ path: `/tmp/core-${name}-${size}.png`, fullPage: true });
      expect(await seriousFindings(page)).toEqual([]);
    }
  }
});
