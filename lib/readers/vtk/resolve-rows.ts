import { locateColumns } from '../locate-columns';
import { rejectAtOnce, type ReasonCollector } from '../reason-collector';
import type { GridColumn } from './grid-columns';

export interface RowsFound { columns: GridColumn[]; indices: number[]; of: 'points' | 'cells' }

/** The columns asked for and what they have rows for. Rejects where one is absent or some are of points and some of cells. */
export function resolveRows(listed: readonly GridColumn[], wanted: readonly string[], reasons: ReasonCollector): RowsFound {
  const indices = locateColumns(listed.map(({ name }) => name), wanted, null, reasons);
  const columns = indices.flatMap((index) => listed[index] ?? []);
  const names = (of: GridColumn['of']) => columns.filter((column) => column.of === of).map(({ name }) => name);
  const [points, cells] = [names('points'), names('cells')];
  if (points.length > 0 && cells.length > 0) {
    rejectAtOnce(reasons, {
      code: 'mixed-rows', line: null, column: (indices[columns.findIndex(({ of }) => of === 'cells')] ?? 0) + 1,
      found: `${cells.join(', ')} of cells beside ${points.join(', ')}`, expected: 'columns of points alone, or of cells alone',
    });
  }
  return { columns, indices, of: cells.length > 0 || (points.length === 0 && listed.some(({ of }) => of === 'cells') && !listed.some(({ of }) => of === 'points')) ? 'cells' : 'points' };
}
