import type { ColumnBatch } from '../source';
import { createCellBatch, type CellBatch, type RefuseCell } from './cell-rows';
import { timeName, type GridColumn } from './grid-columns';
import { arrayKey, type ArrayName, type GridFile } from './grid-file';
import { createCellRows, createPointRows, needSegment, type PieceAsked } from './piece-rows';
import { readGhosts } from './read-ghosts';

const batchRows = 2048;

export interface RowsAsked {
  file: GridFile;
  columns: readonly GridColumn[];
  of: 'points' | 'cells';
  /** So many rows of each piece at most. */
  most: number;
  refuse: RefuseCell;
  /** The arrays are used again for the next batch. */
  onBatch: (batch: ColumnBatch) => void;
}

/** Fills one column with the rows of a piece from one on. */
type Fill = (from: number, count: number, into: Float64Array) => void;

/** Hands on the rows of all pieces, and returns how many it left out, which another piece has as its own. */
export function deliverRows({ file, columns, of, most, refuse, onBatch }: RowsAsked): number {
  const part = columns.map(() => new Float64Array(batchRows));
  const batch = columns.map(() => new Float64Array(batchRows));
  const geometry = createCellBatch(batchRows);
  let filled = 0;
  let leftOut = 0;
  const flush = () => {
    if (filled > 0) onBatch({ rows: filled, columns: batch, lines: null });
    filled = 0;
  };
  const keepRow = (row: number) => {
    if (filled === batchRows) flush();
    for (const [slot, values] of part.entries()) (batch[slot] as Float64Array)[filled] = values[row] as number;
    filled += 1;
  };
  for (const [index, piece] of file.pieces.entries()) {
    const asked: PieceAsked = { file, index, refuse };
    const rows = Math.min(most, of === 'points' ? piece.points : piece.cells);
    if (rows === 0) continue;
    const isGhost = readGhosts(asked, of, rows);
    const fills = prepareFills(asked, { columns, of, rows, geometry });
    for (let from = 0; from < rows; from += batchRows) {
      const count = Math.min(batchRows, rows - from);
      fills.begin(from, count);
      for (const [slot, fill] of fills.columns.entries()) fill(from, count, part[slot] as Float64Array);
      for (let row = 0; row < count; row += 1) {
        if (isGhost(from + row)) leftOut += 1;
        else keepRow(row);
      }
    }
  }
  flush();
  return leftOut;
}

interface FillsAsked { columns: readonly GridColumn[]; of: 'points' | 'cells'; rows: number; geometry: CellBatch }

function prepareFills(asked: PieceAsked, { columns, of, rows: count, geometry }: FillsAsked): { begin: (from: number, count: number) => void; columns: Fill[] } {
  const used = new Set(columns.flatMap(({ source }) => (source.kind === 'geometry' ? [source.what] : [])));
  const rows = used.size === 0 ? null : of === 'cells' ? createCellRows(asked, count, used.has('volume')) : createPointRows(asked);
  return {
    begin: (from, some) => rows?.fill(from, some, geometry),
    columns: columns.map(({ source }): Fill => {
      switch (source.kind) {
        case 'geometry': return (_from, some, into) => into.set(geometry[source.what].subarray(0, some));
        case 'time': return fillTime(asked);
        case 'array': return fillComponent(asked, source, count);
      }
    }),
  };
}

function fillTime({ file }: PieceAsked): Fill {
  const time = file.arrays.get(arrayKey({ section: 'FieldData', name: timeName }));
  const value = new Float64Array([NaN]);
  if (time !== undefined && time.values.length() > 0) time.values.copy(0, 1, value);
  return (_from, count, into) => into.fill(value[0] as number, 0, count);
}

function fillComponent(asked: PieceAsked, { array, component }: { array: ArrayName; component: number }, rows: number): Fill {
  const { components } = array;
  const { values, from: start } = needSegment(asked, array, rows * components);
  if (components === 1) return (from, count, into) => values.copy(start + from, count, into);
  const several = new Float64Array(batchRows * components);
  return (from, count, into) => {
    values.copy(start + from * components, count * components, several);
    for (let row = 0; row < count; row += 1) into[row] = several[row * components + component] as number;
  };
}
