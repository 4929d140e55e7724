import { ghostNames } from './grid-columns';
import { findSegment, needSegment, type PieceAsked } from './piece-rows';
import { createStoredNumbers } from './stored-segment';

/** Bits of vtkGhostType: duplicate and hidden points; duplicate, refined and hidden cells. */
const known = { points: 1 | 2, cells: 1 | 8 | 32 };

/**
 * Whether a row is one that counts elsewhere: a duplicate of another piece, hidden, or refined into smaller cells. Older files
 * number levels of such cells instead. Refused where a mark means something else.
 */
export function readGhosts(asked: PieceAsked, of: 'points' | 'cells', rows: number): (row: number) => boolean {
  const section = of === 'points' ? 'PointData' : 'CellData';
  for (const name of ghostNames) {
    if (findSegment(asked, section, name) === null) continue;
    const mark = createStoredNumbers(needSegment(asked, { section, name }, rows));
    return (row) => {
      const value = mark(row);
      if (!(value >= 0) || (name === 'vtkGhostType' && (value & ~known[of]) !== 0)) {
        asked.refuse('unsupported-format', `VTK XML with ${name} ${value}, row ${row + 1}`, `it with no marks but for duplicates and hidden ${of}`);
      }
      return value > 0;
    };
  }
  return () => false;
}
