import type { ColumnsPreview } from '../column-format';
import { createColumnStore, type ColumnStore } from '../column-store';
import { createReasonCollector } from '../reason-collector';
import { RejectedFile } from '../rejected-file';
import { collectArrays } from './collect-arrays';
import { isTime, listColumns, type GridColumn } from './grid-columns';
import type { ArrayName } from './grid-file';
import { deliverRows } from './grid-rows';

const shownRows = 10;
/** Numbers kept of the points and faces of the cells shown. */
const keptOfCells = 10_000;

/** The columns of a VTK file and the first rows of its first piece: of cells where it has values in cells, else of points. */
export async function previewVtk(pieces: AsyncIterable<Buffer>): Promise<ColumnsPreview> {
  const store = createColumnStore();
  try {
    return await previewInto(store, pieces);
  } finally {
    store.close();
  }
}

async function previewInto(store: ColumnStore, pieces: AsyncIterable<Buffer>): Promise<ColumnsPreview> {
  const file = await collectArrays(pieces, {
    store, reasons: createReasonCollector(), onPiece: () => undefined, firstPieceOnly: true, keep: (array, _file, piece) => (piece === 0 ? keptOf(array) : 0),
  });
  const columns = listColumns(file);
  const of = columns.some((column) => column.of === 'cells') ? 'cells' : 'points';
  const shown = columns.filter((column) => column.of === of || column.of === 'both');
  const texts = new Map<GridColumn, string[]>();
  const show = (some: readonly GridColumn[]) => deliverRows({
    file: { ...file, pieces: file.pieces.slice(0, 1) }, columns: some, of, most: shownRows,
    refuse: (code, found, expected) => {
      throw new RejectedFile([{ code, count: 1, line: null, column: null, found, expected }]);
    },
    onBatch({ rows, columns: values }) {
      for (const [slot, column] of some.entries()) texts.set(column, [...(values[slot] as Float64Array).subarray(0, rows)].map(String));
    },
  });
  show(shown.filter(({ source }) => source.kind !== 'geometry'));
  showCoordinates(() => show(shown.filter(({ source }) => source.kind === 'geometry')));
  const rows = Math.max(0, ...[...texts.values()].map(({ length }) => length));
  return {
    delimiter: null, hasHeader: true, header: columns.map(({ name }) => name),
    firstRows: Array.from({ length: rows }, (_, row) => columns.map((column) => texts.get(column)?.[row] ?? '')),
  };
}

/** Cells without a measure leave their coordinates empty: what is mapped may be of points. */
function showCoordinates(show: () => void): void {
  try {
    show();
  } catch (error) {
    if (!(error instanceof RejectedFile)) throw error;
  }
}

function keptOf(array: ArrayName): number {
  switch (array.section) {
    case 'FieldData': return isTime(array) ? 1 : 0;
    case 'PointData':
    case 'CellData': return shownRows * array.components;
    case 'Cells': return keptOfCells;
    case 'Points':
    case 'Coordinates': return Infinity;
  }
}
