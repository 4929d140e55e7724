import { TrendLine } from '../figures/trend-line';
import { Missing } from '../tables/cells';
import type { MatrixCase } from './cell-words';

interface CaseTrendProps { row: MatrixCase; errors: readonly (number | null)[]; range: readonly [number, number] | null }

export function CaseTrend({ row, errors, range }: CaseTrendProps) {
  if (row.cells.some(({ exact }) => exact)) return <span className="text-graphite">at round-off</span>;
  if (range === null || errors.every((error) => error === null)) return <Missing reason="No error on a grid that all studies share" />;
  return <TrendLine errors={errors} range={range} label={`Errors of ${row.name} on equal grids over releases`} />;
}
