import type { DecimalMark } from './explain-row';
import type { ChunkResult, ChunkWork } from './table-work';

/** A chunk that waits for its turn. */
export interface Turn<Part> {
  room: number;
  bytes: Uint8Array;
  /** What it came to before its turn; null where it is to be read in its turn, undefined while a helper has it. */
  ahead: ChunkResult<Part> | null | undefined;
}

export interface ChunkTurns<Part> {
  /** Puts a chunk at the end of the line. */
  add(turn: Turn<Part>): void;
  waiting(): number;
  /** Takes every chunk whose turn it is and that nobody has any more. */
  settle(): void;
  /** Lines of the file so far. */
  line(): number;
  digits(): number[];
}

export interface TurnsOptions<Part> {
  work: ChunkWork<Part>;
  /** Lines of the file to pass over. */
  skipped: number;
  /** Has the parts in the order of the file, and the rooms back. */
  onPart: (part: Part, room: number) => void;
}

/** Brings what chunks came to, in whatever order, back into the order of the file. */
export function createChunkTurns<Part>({ work, skipped, onPart }: TurnsOptions<Part>): ChunkTurns<Part> {
  const turns: Turn<Part>[] = [];
  let line = 0;
  let mark: DecimalMark | null = null;
  let digits: number[] = [];

  /** What a chunk read ahead comes to in its turn; null where its decimal mark is not that of the file. */
  const place = (ahead: ChunkResult<Part>): ChunkResult<Part> | null => {
    if (ahead.mark !== null && mark !== null && ahead.mark.mark !== mark.mark) return null;
    const ownMark = ahead.mark === null ? null : { mark: ahead.mark.mark, line: line + ahead.mark.line };
    return { ...ahead, line: line + ahead.line, mark: mark ?? ownMark };
  };

  return {
    add: (turn) => void turns.push(turn),
    waiting: () => turns.length,
    settle() {
      for (let turn = turns[0]; turn !== undefined && turn.ahead !== undefined; turn = turns[0]) {
        const result = (turn.ahead === null ? null : place(turn.ahead)) ?? work.read(turn.bytes, { line, skipped, mark });
        ({ line, mark } = result);
        digits = result.digits.map((most, at) => Math.max(most, digits[at] ?? 0));
        turns.shift();
        onPart(result.part, turn.room);
      }
    },
    line: () => line,
    digits: () => digits,
  };
}
