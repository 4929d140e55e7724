import { lowestOrder } from './lowest-order';
import type { MatrixCase, MatrixRelease, MatrixStudy } from './matrix-input';
import type { MatrixCell } from './schema';

/** One case on one release. `next` is the release after it, null for the last one. */
export function makeCell(row: MatrixCase, release: MatrixRelease, next: MatrixRelease | null, study: MatrixStudy | undefined): MatrixCell {
  const empty: MatrixCell = {
    release: release.version, state: next !== null && row.createdAt >= next.createdAt ? 'younger' : 'not-run', study: null, revision: null,
    outcome: null, exact: false, reasons: [], lowest: null, gridsRead: null, gridsPlanned: null, waived: false, signed: false, assessedAt: null,
  };
  if (!study) return empty;
  const { assessed } = study;
  const cell: MatrixCell = {
    ...empty, state: study.state, study: study.id, revision: study.revision, gridsRead: study.gridsRead, gridsPlanned: study.gridsPlanned,
    signed: study.state === 'signed',
  };
  if (!assessed) return cell;
  const { outcome, reasons } = assessed.assessment;
  return {
    ...cell, revision: assessed.revision, outcome, reasons, exact: outcome === 'pass' && reasons.length > 0 && reasons.every((reason) => reason === 'exact'),
    lowest: lowestOrder(assessed.assessment), assessedAt: new Date(assessed.at).toISOString(),
  };
}
