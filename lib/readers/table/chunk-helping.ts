import type { Turn } from './chunk-turns';
import type { SharedMemory } from './table-memory';
import type { ChunkResult } from './table-work';

/** Another thread that reads chunks ahead. */
export interface ChunkHelper<Part> {
  /** Reads the first `length` bytes of a room. */
  readAhead(room: number, length: number): Promise<ChunkResult<Part> | null>;
  close(): Promise<void>;
}

/** The memory that a helper works in too, and where the rooms for chunks are in it. */
export interface SharedRooms extends SharedMemory { rooms: readonly number[] }

export type OpenHelper<Part> = (shared: SharedRooms) => Promise<ChunkHelper<Part>>;

/** So many chunks wait for the helper at most; the next is read here meanwhile. */
const mostAhead = 4;
/** A file of fewer chunks is read before a helper has started. */
const chunksAlone = 3;

export interface Helping<Part> {
  /** Whether the helper takes the chunk; its turn then waits until the helper has answered. */
  take(turn: Turn<Part>): boolean;
  /** Until the helper has answered once more. Throws what it failed with. */
  answered(): Promise<void>;
  close(): Promise<void>;
}

/** Hands chunks to a helper, which is started for a large file only. */
export function createHelping<Part>(open: (() => Promise<ChunkHelper<Part>>) | undefined): Helping<Part> {
  let helper: ChunkHelper<Part> | null = null;
  let opening: Promise<void> | null = null;
  let chunks = 0;
  let ahead = 0;
  let failure: { error: unknown } | null = null;
  let wake: () => void = () => undefined;

  const fail = (error: unknown) => {
    failure ??= { error };
    wake();
  };

  return {
    take(turn) {
      chunks += 1;
      if (chunks === chunksAlone && open !== undefined) {
        opening = open().then((opened) => {
          helper = opened;
        }, fail);
      }
      if (failure !== null) throw failure.error;
      if (helper === null || ahead >= mostAhead) return false;
      ahead += 1;
      turn.ahead = undefined;
      helper.readAhead(turn.room, turn.bytes.length).then((result) => {
        ahead -= 1;
        turn.ahead = result;
        wake();
      }, fail);
      return true;
    },
    async answered() {
      if (failure === null) await new Promise<void>((resolve) => { wake = resolve; });
      if (failure !== null) throw failure.error;
    },
    async close() {
      await opening;
      await helper?.close();
    },
  };
}
