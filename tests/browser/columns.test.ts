import { expect } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createStudyContract, getGridResultContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { browserTest, overflowOf, seriousFindings } from '@/tests/support/browser';
import { heatTable } from '@/tests/support/grids';
import { signUp } from '@/tests/support/people';
import { awaitStudy, putFile } from '@/tests/support/study';
import { makeWork } from '@/tests/support/work';

const hasSettled = (label: string) => ({ grids }: { grids: { label: string; state: string }[] }) => grids.some((grid) => grid.label === label && !['expected', 'stored', 'reading'].includes(grid.state));

browserTest('a table that looks as if it had no names is told to have them, seen so, and read', async ({ open }) => {
  const person = await signUp();
  const work = await makeWork(person);
  const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: work.case.gridPlan } });
  const table = heatTable(8, { header: '1,2,3,4' }).toString().replaceAll(',', ';').replaceAll('.', ',');
  await putFile(person, { id: study.id, label: 'n8' }, Buffer.from(table));
  await awaitStudy(person, study.id, hasSettled('n8'));
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person, size: 'phone' });

  const form = page.getByRole('form', { name: 'Columns' });
  await form.getByText('Semicolon between columns, decimal comma, no line of names.').first().waitFor();
  await form.getByRole('columnheader', { name: 'c4' }).waitFor();
  await form.getByLabel('Coordinate x').selectOption('c1');
  await form.getByLabel('Between columns').selectOption('tab');
  await form.getByRole('columnheader', { name: '1;2;3;4' }).waitFor();
  await form.getByLabel('Between columns').selectOption('');
  await form.getByLabel('Names of columns').selectOption('the first line names them');
  await form.getByText('Semicolon between columns, decimal comma, names in line 1.').first().waitFor();
  expect(await form.getByLabel('Coordinate x').inputValue()).toBe('');
  expect(await seriousFindings(page)).toEqual([]);
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);

  await form.getByLabel('Between columns').selectOption('comma');
  await form.getByLabel('Decimal mark').selectOption('comma');
  await form.getByText('A comma cannot part the columns and be the decimal mark').waitFor();
  await form.getByLabel('Between columns').selectOption('');
  await form.getByRole('columnheader', { name: '4', exact: true }).waitFor();
  for (const [label, column] of [['Coordinate x', '1'], ['Coordinate y', '2'], ['Weight of a row', '3'], ['Field T', '4']] as const) {
    await form.getByLabel(label).selectOption(column);
  }
  await form.getByRole('button', { name: 'Save columns and read' }).click();
  await page.getByRole('row', { name: /^n8\b.*\bread\b/ }).waitFor({ timeout: 30_000 });
  await page.getByRole('cell', { name: 'decimal comma, names in the first line' }).waitFor();
  const { mapping } = await ok(person, getGridResultContract, { params: { id: study.id, label: 'n8' } });
  expect(mapping).toEqual({ x: '1', y: '2', weight: '3', fields: { T: '4' }, table: { hasHeader: true, decimalMark: 'comma' } });
});

/** T and its gradient on n × n cells, each derivative under a name of the solver's own. */
function gradientTable(n: number): Buffer {
  const rows = ['mesh/x,mesh/y,mesh/volume,T,grad T(1),grad T(2),wall'];
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) {
      const [x, y] = [(i + 0.5) / n, (j + 0.5) / n];
      const [sx, cx, sy, cy] = [Math.sin(Math.PI * x), Math.cos(Math.PI * x), Math.sin(Math.PI * y), Math.cos(Math.PI * y)];
      rows.push([x, y, n ** -2, sx * sy + 0.5 * x + n ** -2, Math.PI * cx * sy + 0.5 + 2 / n, Math.PI * sx * cy + 2 / n, Math.min(x, y)].join(','));
    }
  }
  return Buffer.from(`${rows.join('\n')}\n`);
}

browserTest('columns of a gradient are mapped one for each direction', async ({ open }) => {
  const person = await signUp();
  const work = await makeWork(person);
  const made = await ok(person, createCaseContract, {
    body: {
      name: 'Heat with its gradient', kind: 'order', code: work.code.slug, problem: work.problem.slug,
      fields: [{ field: 'T', norms: [{ norm: 'L2', formalOrder: 2 }, { norm: 'H1', formalOrder: 1 }] }], gridPlan: work.case.gridPlan,
    },
  });
  const study = await ok(person, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids: made.gridPlan } });
  for (const n of [8, 16, 32]) await putFile(person, { id: study.id, label: `n${n}` }, gradientTable(n));
  await awaitStudy(person, study.id, hasSettled('n32'));
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person });
  const form = page.getByRole('form', { name: 'Columns' });
  await form.getByText('Grids n8, n16 and n32 wait for it.').waitFor();
  expect(await form.getByLabel('Coordinate y').inputValue()).toBe('mesh/y');
  expect(await form.getByLabel('Field T').inputValue()).toBe('T');
  await form.getByLabel('Derivative of T along x').selectOption('grad T(1)');
  await form.getByLabel('Derivative of T along y').selectOption('not in the file');
  await form.getByText('Columns that tell the boundary').click();
  await form.getByLabel('Distance to the boundary').selectOption('wall');
  await form.getByRole('button', { name: 'Save columns and read' }).click();
  await form.getByText('No column, but one for another direction.').waitFor();
  expect(await seriousFindings(page)).toEqual([]);
  expect(await overflowOf(page)).toBeLessThanOrEqual(0);
  await form.getByLabel('Derivative of T along y').selectOption('grad T(2)');
  await form.getByRole('button', { name: 'Save columns and read' }).click();
  await page.getByRole('row', { name: /^n32\b.*\bread\b/ }).waitFor({ timeout: 30_000 });
  const { mapping, gradients } = await ok(person, getGridResultContract, { params: { id: study.id, label: 'n8' } });
  expect(mapping).toEqual({ x: 'mesh/x', y: 'mesh/y', weight: 'mesh/volume', distance: 'wall', fields: { T: ['T', 'grad T(1)', 'grad T(2)'] } });
  expect(gradients).toMatchObject([{ field: 'T', H1: expect.closeTo(Math.SQRT2 * 2 / 8, 10) as number }]);
});
