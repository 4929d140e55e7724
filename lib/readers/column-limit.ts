import { RejectedFile } from './rejected-file';

/** Far more than any solver writes; names and first rows of all of them are kept and shown. */
const mostColumns = 100_000;

/** Throws RejectedFile where a file has more columns than are read. */
export function refuseManyColumns(columns: number): void {
  if (columns <= mostColumns) return;
  throw new RejectedFile([{
    code: 'too-many-columns', count: 1, line: null, column: null, found: `${columns} columns or more`, expected: `at most ${mostColumns} columns`,
  }]);
}
