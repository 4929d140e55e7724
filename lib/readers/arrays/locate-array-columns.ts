import { resolveColumn } from '../../domain/columns/resolve-column';
import { locateColumns } from '../locate-columns';
import type { ReasonCollector } from '../reason-collector';
import { elementsOf, type ArrayColumn, type NamedArray } from './array-columns';
import { alignColumns, type RowsOfColumn } from './grid-axes';

export interface LocatedColumns {
  /** Places among all columns, in the order asked for. */
  indices: number[];
  found: ArrayColumn[];
  rows: number;
  aligned: RowsOfColumn[];
}

/**
 * The columns wanted, all of one length or axes of their grid. What is asked for but holds no numbers, is not there, or has another length than
 * the first goes to the reasons, and is thrown.
 */
export function locateArrayColumns(arrays: readonly NamedArray[], columns: readonly ArrayColumn[], { wanted, reasons }: { wanted: readonly string[]; reasons: ReasonCollector }): LocatedColumns {
  const header = columns.map(({ name }) => name);
  for (const name of wanted.filter((each) => resolveColumn(header, each) === 'absent')) {
    const unread = arrays.flatMap(({ path, members }) => members.flatMap(({ suffix, problem }) => (problem === null ? [] : [{ name: `${path}${suffix}`, problem }])));
    const at = resolveColumn(unread.map((each) => each.name), name);
    const found = typeof at === 'number' ? unread[at] : undefined;
    if (found) reasons.add({ code: 'column-type', line: null, column: null, found: `${found.name}: ${found.problem}`, expected: 'integers or floating-point numbers' });
  }
  reasons.throwIfAny();
  const indices = locateColumns(header, wanted, null, reasons);
  const found = indices.flatMap((index) => columns[index] ?? []);
  const aligned = alignColumns(found, arrays);
  const rows = aligned[0]?.rows ?? 0;
  for (const [slot, column] of found.entries()) {
    if (aligned[slot]?.rows === rows) continue;
    reasons.add({
      code: 'column-length', line: null, column: (indices[slot] ?? 0) + 1, found: `${column.rows} values (${shapeOf(arrays[column.array]?.dims ?? [])})`,
      expected: `${rows} values, as in ${wanted[0] ?? 'the first column'}`,
    });
  }
  reasons.throwIfAny();
  return { indices, found, rows, aligned };
}

const shapeOf = (dims: readonly number[]): string => (dims.length < 2 ? `${elementsOf(dims)}` : dims.join(' × '));
