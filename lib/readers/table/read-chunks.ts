import { createHelping, type OpenHelper } from './chunk-helping';
import { createChunkTurns, type Turn } from './chunk-turns';
import type { GridChecks } from '../grid-checks';
import { rejectAtOnce } from '../reason-collector';
import { lineTooLong } from './line-too-long';
import { createChunkCutter, roomBytes } from './table-chunks';
import type { TableDialect } from './table-dialect';
import type { TableMemory } from './table-memory';
import type { ChunkWork } from './table-work';

export interface ReadChunksOptions<Part> {
  dialect: TableDialect;
  /** Where chunks are put. */
  memory: TableMemory;
  work: ChunkWork<Part>;
  openHelper?: OpenHelper<Part>;
  checks: GridChecks;
  /** Parts in the order of the file. */
  onPart: (part: Part) => void;
}

const roomCount = 7;

/**
 * Reads a table chunk by chunk, with a helper where the file is large. A chunk comes to the same whoever reads it, and parts
 * are handed over in the order of the file. Once something is wrong, all is read here and in turn. Gives the most
 * significant digits per column.
 */
export async function readChunks<Part>(pieces: AsyncIterable<Buffer>, options: ReadChunksOptions<Part>): Promise<number[]> {
  const { dialect, memory, work, openHelper, checks, onPart } = options;
  const rooms = Array.from({ length: roomCount }, () => memory.take(roomBytes));
  const views = rooms.map((room) => memory.bytes(room, roomBytes));
  const free = rooms.map((_, room) => room);
  const turns = createChunkTurns<Part>({
    work, skipped: dialect.linesBefore,
    onPart(part, room) {
      free.push(room);
      onPart(part);
    },
  });
  const helping = createHelping(openHelper && (() => openHelper({ ...memory.share(), rooms })));

  const untilHelped = async () => {
    await helping.answered();
    turns.settle();
  };
  const takeRoom = async () => {
    while (free.length === 0) await untilHelped();
    return free.pop() as number;
  };
  const cutter = createChunkCutter(dialect.lineEnd, { views, takeRoom });

  try {
    for await (const { room, length } of cutter.cut(pieces)) {
      const bytes = (views[room] as Uint8Array).subarray(0, length);
      const turn: Turn<Part> = { room, bytes, ahead: null };
      const isFirst = turns.waiting() === 0;
      turns.add(turn);
      if (checks.isClean() && !helping.take(turn) && !isFirst) turn.ahead = work.readAhead(bytes);
      turns.settle();
    }
    while (turns.waiting() > 0) await untilHelped();
  } finally {
    await helping.close();
  }
  if (cutter.isLineTooLong()) {
    rejectAtOnce(checks.rows, lineTooLong(turns.line() + 1));
  }
  return turns.digits();
}
