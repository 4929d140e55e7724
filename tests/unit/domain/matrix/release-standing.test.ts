import { describe, expect, it } from 'vitest';
import type { CaseKind } from '@/lib/domain/cases/definition';
import { releaseStanding } from '@/lib/domain/matrix/release-standing';
import type { MatrixCell } from '@/lib/domain/matrix/schema';

type Cell = Pick<MatrixCell, 'state' | 'outcome' | 'waived'>;
const cell = (outcome: Cell['outcome'], changes: Partial<Cell> = {}): Cell => ({ state: 'assessed', outcome, waived: false, ...changes });
const notRun = cell(null, { state: 'not-run' });
const of = (kind: CaseKind, ...cells: Cell[]) => cells.map((each) => ({ kind, cell: each }));

describe('releaseStanding', () => {
  it('stands when every case passes, signed or not', () => expect(releaseStanding('current', of('order', cell('pass'), cell('pass', { state: 'signed' })))).toBe('stands'));
  it('does not stand when one fails, even where others were not run', () => expect(releaseStanding('planned', of('benchmark', cell('fail'), notRun))).toBe('does-not-stand'));
  it('does not stand when one is inconclusive', () => expect(releaseStanding('current', of('exactness', cell('inconclusive')))).toBe('does-not-stand'));
  it('stands on a waiver', () => expect(releaseStanding('current', of('order', cell('fail', { waived: true })))).toBe('stands'));
  it('is incomplete when one was not run', () => expect(releaseStanding('current', of('order', cell('pass'), notRun))).toBe('incomplete'));
  it('is incomplete when one has no outcome', () => expect(releaseStanding('current', of('order', cell('pass'), cell(null)))).toBe('incomplete'));
  it('is incomplete without cases', () => expect(releaseStanding('current', [])).toBe('incomplete'));
  it('is not moved by solution cases', () => {
    expect(releaseStanding('current', [...of('order', cell('pass')), ...of('solution', cell('misses-target'), notRun)])).toBe('stands');
    expect(releaseStanding('current', of('solution', cell('meets-target')))).toBe('incomplete');
  });
  it('is not moved by a case younger than the next release', () => {
    expect(releaseStanding('current', of('order', cell('pass'), cell(null, { state: 'younger' })))).toBe('stands');
  });
  it('is withdrawn when the release is, whatever its cases', () => expect(releaseStanding('withdrawn', of('order', cell('pass')))).toBe('withdrawn'));
});
