import { describe, expect, it } from 'vitest';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { buildMatrix } from '@/lib/domain/matrix/build-matrix';
import type { MatrixCase, MatrixRelease, MatrixStudy } from '@/lib/domain/matrix/matrix-input';
import { assessmentOf } from '../../../support/assessments';
import { errorSeries } from '../../../support/series';

const h = [1 / 8, 1 / 16, 1 / 32, 1 / 64];
const errorsOf = (order: number, factor = 1) => h.map((spacing) => factor * spacing ** order);

const code = { id: 'c', slug: 'brack', name: 'Brack' };
const releases: MatrixRelease[] = ['1.0', '1.1'].map((version, index) => ({ id: version, version, state: 'current', createdAt: 1000 * index }));
const definition = caseDefinitionSchema.parse({
  fields: [{ field: 'u', norms: [{ norm: 'L1', counts: false }, { norm: 'L2', formalOrder: 2 }] }], quantities: [{ name: 'drag', target: 0.02 }],
});
const row: MatrixCase = { id: 'k', slug: 'layer', name: 'Layer', kind: 'order', createdAt: 10, definition };

function study(release: string, order: number, changes: Partial<MatrixStudy> = {}): MatrixStudy {
  const assessment = assessmentOf([errorSeries(h, errorsOf(order))]);
  return {
    id: `s-${release}`, caseId: 'k', releaseId: release, revision: 1, state: 'assessed', gridsRead: 4, gridsPlanned: 4,
    assessed: { revision: 1, at: 5000, assessment }, ...changes,
  };
}

describe('buildMatrix', () => {
  it('tells outcome, lowest order and standing, and the formal order of the norm that counts', () => {
    const matrix = buildMatrix({ code, releases, cases: [row], studies: [study('1.0', 2), study('1.1', 1)] });
    expect(matrix.cases).toMatchObject([{ formalOrder: 2, target: 0.02, cells: [{ release: '1.0', outcome: 'pass' }, { release: '1.1', outcome: 'fail' }] }]);
    const [before, after] = matrix.cases[0]?.cells ?? [];
    expect(before?.lowest?.observed).toBeCloseTo(2, 9);
    expect(after?.lowest?.observed).toBeCloseTo(1, 9);
    expect(matrix.releases.map((release) => release.standing)).toEqual(['stands', 'does-not-stand']);
    expect(matrix.releases[1]?.counts).toMatchObject({ fail: 1, passOrExact: 0 });
  });

  it('lists what got worse between the last two releases, at the finest spacing both have', () => {
    const matrix = buildMatrix({ code, releases, cases: [row], studies: [study('1.0', 2), study('1.1', 1)] });
    expect(matrix.worse).toMatchObject([{ case: 'layer', field: 'u', norm: 'L2', h: 1 / 64, before: '1.0', after: '1.1' }]);
    expect(matrix.worse[0]?.ratio).toBeCloseTo(64, 9);
    expect(buildMatrix({ code, releases, cases: [row], studies: [study('1.0', 1), study('1.1', 2)] }).worse).toEqual([]);
  });

  it('draws the trend on the finest grid that all studies share', () => {
    const coarser = assessmentOf([errorSeries([1 / 4, ...h.slice(0, 3)], [1 / 4, ...h.slice(0, 3)].map((spacing) => 3 * spacing ** 2))]);
    const studies = [study('1.0', 2), study('1.1', 2, { assessed: { revision: 1, at: 5000, assessment: coarser } })];
    expect(buildMatrix({ code, releases, cases: [row], studies }).cases[0]?.trend).toEqual([
      { release: '1.0', error: (1 / 32) ** 2 }, { release: '1.1', error: 3 * (1 / 32) ** 2 },
    ]);
  });

  it('keeps the outcome of the last assessment while a new revision collects', () => {
    const collecting = study('1.0', 2, { revision: 2, state: 'collecting', gridsRead: 1, gridsPlanned: 5 });
    const cell = buildMatrix({ code, releases, cases: [row], studies: [collecting] }).cases[0]?.cells[0];
    expect(cell).toMatchObject({ state: 'collecting', outcome: 'pass', revision: 1, gridsRead: 1, gridsPlanned: 5, assessedAt: '1970-01-01T00:00:05.000Z' });
  });

  it('does not ask of a release what a younger case would, and asks it of the last one', () => {
    const younger = { ...row, createdAt: 2000 };
    const matrix = buildMatrix({ code, releases, cases: [younger], studies: [] });
    expect(matrix.cases[0]?.cells.map((cell) => cell.state)).toEqual(['younger', 'not-run']);
    expect(matrix.releases.map((release) => release.counts.notRun)).toEqual([0, 1]);
  });

  it('marks a pass at round-off as exact, and compares no errors there', () => {
    const exact = (factor: number) => study('1.1', 2, {
      assessed: { revision: 1, at: 0, assessment: assessmentOf([errorSeries(h, h.map(() => factor * 1e-16), { expectExact: true })]) },
    });
    const matrix = buildMatrix({ code, releases, cases: [row], studies: [{ ...exact(1), releaseId: '1.0' }, exact(20)] });
    expect(matrix.cases[0]?.cells).toMatchObject([{ exact: true, outcome: 'pass' }, { exact: true, outcome: 'pass' }]);
    expect(matrix.worse).toEqual([]);
  });

  it('answers for a code without releases or cases', () => {
    expect(buildMatrix({ code, releases: [], cases: [row], studies: [] })).toMatchObject({ releases: [], worse: [], cases: [{ cells: [], trend: [] }] });
    expect(buildMatrix({ code, releases, cases: [], studies: [] }).releases.map((release) => release.standing)).toEqual(['incomplete', 'incomplete']);
  });
});
