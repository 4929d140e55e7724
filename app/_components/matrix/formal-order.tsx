import { formatPercent } from '@/lib/domain/numbers/format-percent';
import { Missing } from '../tables/cells';
import type { MatrixCase } from './cell-words';

/** What a case is held to: an order, exactness, or a target. */
export function FormalOrder({ row }: { row: MatrixCase }) {
  if (row.kind === 'exactness') return <>exact</>;
  if (row.kind === 'solution' && row.target !== null) return <span className="whitespace-nowrap">≤ {formatPercent(row.target)}</span>;
  return row.formalOrder === null ? <Missing reason="No formal order" /> : <>{row.formalOrder}</>;
}
