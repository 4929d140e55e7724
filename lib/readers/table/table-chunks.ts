import { longestLine } from '../read-head';

/** A chunk is the lines that begin within this many bytes: the same whatever pieces the bytes came in. */
const chunkBytes = 1024 * 1024;
/** One byte is left for a line end where the file ends without. */
const mostChunkBytes = chunkBytes + longestLine + 1;
/** Numbers are looked at many bytes at a time, past the end of the last. */
export const roomBytes = mostChunkBytes + 64;

export interface CutChunk { room: number; length: number }

/** Where chunks are cut into; a room is the receiver's until it gives it back. */
export interface ChunkRooms {
  views: readonly Uint8Array[];
  takeRoom(): Promise<number>;
}

export interface ChunkCutter {
  /** Chunks in the order of the file. */
  cut(pieces: AsyncIterable<Buffer>): AsyncGenerator<CutChunk, void>;
  /** Whether cutting ended at a line too long to read. */
  isLineTooLong(): boolean;
}

/** Cuts a stream of bytes into chunks of whole lines, the last of which gets an end where it has none. */
export function createChunkCutter(lineEnd: number, rooms: ChunkRooms): ChunkCutter {
  let isTooLong = false;
  return {
    async *cut(pieces) {
      let room = await rooms.takeRoom();
      let view = rooms.views[room] as Uint8Array;
      let filled = 0;
      for await (const piece of pieces) {
        let at = 0;
        while (at < piece.length) {
          const rest = piece.length - at;
          const wanted = chunkBytes - 1 - filled;
          const stop = rest > wanted ? piece.indexOf(lineEnd, at + Math.max(0, wanted)) : -1;
          const end = stop < 0 ? piece.length : stop + 1;
          if (filled + end - at >= mostChunkBytes) {
            isTooLong = true;
            const whole = view.subarray(0, filled).lastIndexOf(lineEnd) + 1;
            if (whole > 0) yield { room, length: whole };
            return;
          }
          view.set(piece.subarray(at, end), filled);
          filled += end - at;
          at = end;
          if (stop < 0) continue;
          yield { room, length: filled };
          room = await rooms.takeRoom();
          view = rooms.views[room] as Uint8Array;
          filled = 0;
        }
      }
      if (filled === 0) return;
      if (view[filled - 1] !== lineEnd) view[filled++] = lineEnd;
      yield { room, length: filled };
    },
    isLineTooLong: () => isTooLong,
  };
}
