import { countCells } from './count-cells';
import { errorTrend } from './error-trend';
import { findWorse } from './find-worse';
import { makeCell } from './make-cell';
import type { MatrixCase, MatrixRelease, MatrixStudy } from './matrix-input';
import { releaseStanding } from './release-standing';
import type { Matrix } from './schema';

interface MatrixParts {
  code: Matrix['code'];
  /** Oldest first, both. */
  releases: readonly MatrixRelease[];
  cases: readonly MatrixCase[];
  studies: readonly MatrixStudy[];
}

/** Cases by releases, with the standing of each release, the trend of each case, and what got worse. */
export function buildMatrix({ code, releases, cases, studies }: MatrixParts): Matrix {
  const studyOf = (row: MatrixCase, release: MatrixRelease) => studies.find((study) => study.caseId === row.id && study.releaseId === release.id);
  const assessedOf = (row: MatrixCase) => releases.flatMap((release) => {
    const assessed = studyOf(row, release)?.assessed;
    return assessed ? [{ release: release.version, assessment: assessed.assessment }] : [];
  });
  const rows = cases.map((row) => ({
    id: row.id, slug: row.slug, name: row.name, kind: row.kind, ...declared(row),
    cells: releases.map((release, index) => makeCell(row, release, releases[index + 1] ?? null, studyOf(row, release))),
    trend: errorTrend(assessedOf(row)),
  }));
  const [before, after] = releases.slice(-2);
  return {
    code,
    releases: releases.map(({ id, version, state, createdAt }, index) => {
      const cells = rows.flatMap(({ kind, cells: all }) => (all[index] ? [{ kind, cell: all[index] }] : []));
      return {
        id, version, state, createdAt: new Date(createdAt).toISOString(), standing: releaseStanding(state, cells),
        counts: countCells(cells.map(({ cell }) => cell)),
      };
    }),
    cases: rows,
    worse: cases.flatMap((row) => {
      const assessed = assessedOf(row);
      const [then, now] = [before, after].map((release) => assessed.find((each) => each.release === release?.version));
      return then && now ? findWorse(row, then, now) : [];
    }),
  };
}

/** The formal order of the first counting norm, else of the first quantity; and the first target. */
function declared({ definition: { fields, quantities } }: MatrixCase): { formalOrder: number | null; target: number | null } {
  const counting = fields.flatMap((field) => field.norms).find((norm) => norm.counts && norm.formalOrder !== undefined);
  return {
    formalOrder: counting?.formalOrder ?? quantities.find((quantity) => quantity.formalOrder !== undefined)?.formalOrder ?? null,
    target: quantities.find((quantity) => quantity.target !== undefined)?.target ?? null,
  };
}
