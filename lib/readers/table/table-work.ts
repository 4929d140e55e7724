import type { DecimalMark } from './explain-row';
import { prepareGathering } from '../gather-grid';
import type { GridPart, GridTask } from '../grid-task';
import { createGridChecks, type GridChecks } from '../grid-checks';
import { createChunkReader, type ChunkStart } from './read-chunk';
import type { TableDialect } from './table-dialect';
import type { TableMemory } from './table-memory';

/** What is made of one chunk; lines are counted on from where it was said to begin. */
export interface ChunkResult<Part> {
  part: Part;
  line: number;
  mark: DecimalMark | null;
  /** Most significant digits read so far, per column. */
  digits: number[];
}

export interface ChunkWork<Part> {
  /** Reads a chunk of which everything before has been read. */
  read(bytes: Uint8Array, start: ChunkStart): ChunkResult<Part>;
  /** Reads one before its turn, as if it began the file; null where anything is wrong with it, which is told in its turn. */
  readAhead(bytes: Uint8Array): ChunkResult<Part> | null;
}

/** The reading of one table: plain data, which a thread can hand to another. */
export interface TableTask {
  dialect: TableDialect;
  /** The columns of the file, in the order of the plan. */
  indices: number[];
  grid: GridTask;
}

/** Makes parts of norms of chunks, in a memory; what is wrong with those read in their turn goes to `checks`. */
export function createTableWork({ dialect, indices, grid }: TableTask, checks: GridChecks, memory: TableMemory): ChunkWork<GridPart> {
  // Two names may mean one column; it is read once.
  const wanted = [...new Set(indices)];
  const slots = indices.map((index) => wanted.indexOf(index));
  const reader = createChunkReader({ dialect, wanted, memory });
  const gather = prepareGathering(grid, memory.engine);

  const read = (bytes: Uint8Array, start: ChunkStart, into: GridChecks): ChunkResult<GridPart> => {
    const gatherer = gather(into);
    const end = reader.read(bytes, start, into.rows, ({ rows, columns, lines }) => {
      gatherer.add({ rows, columns: slots.map((slot) => columns[slot] as Float64Array), lines });
    });
    const digits = reader.significantDigits();
    return { part: gatherer.finish(indices), ...end, digits: slots.map((slot) => digits[slot] ?? 0) };
  };
  return {
    read: (bytes, start) => read(bytes, start, checks),
    readAhead(bytes) {
      const own = createGridChecks(grid.t);
      const result = read(bytes, { line: 0, skipped: 0, mark: null }, own);
      return own.isClean() ? result : null;
    },
  };
}
