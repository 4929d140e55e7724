import type { CaseKind } from '../cases/definition';
import type { ReleaseState } from '../codes/schema';
import type { MatrixCell, Standing } from './schema';

interface CellOfKind { kind: CaseKind; cell: Pick<MatrixCell, 'state' | 'outcome' | 'waived'> }

/**
 * Stands when every order, exactness and benchmark case passes or is waived; does not stand when one fails or is
 * inconclusive without waiver; incomplete when none does but some have no outcome, or there are none. Solution cases
 * verify nothing, and a case that came after the next release is not asked of this one.
 */
export function releaseStanding(state: ReleaseState, cells: readonly CellOfKind[]): Standing {
  if (state === 'withdrawn') return 'withdrawn';
  const asked = cells.filter(({ kind, cell }) => kind !== 'solution' && cell.state !== 'younger').map(({ cell }) => cell);
  if (asked.some((cell) => !cell.waived && (cell.outcome === 'fail' || cell.outcome === 'inconclusive'))) return 'does-not-stand';
  const isComplete = asked.length > 0 && asked.every((cell) => cell.waived || cell.outcome === 'pass');
  return isComplete ? 'stands' : 'incomplete';
}
