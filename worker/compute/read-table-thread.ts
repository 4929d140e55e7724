import { parentPort } from 'node:worker_threads';
import type { GridPart } from '@/lib/readers/grid-task';
import { createGridChecks } from '@/lib/readers/grid-checks';
import { createTableMemory } from '@/lib/readers/table/table-memory';
import { createTableWork, type ChunkWork } from '@/lib/readers/table/table-work';
import { roomBytes } from '@/lib/readers/table/table-chunks';
import type { HelperAnswer, HelperMessage } from './table-helper';

if (!parentPort) throw new Error('read-table-thread runs as a worker thread only.');
const port = parentPort;
let work: ChunkWork<GridPart> | null = null;
let rooms: Uint8Array[] = [];

function answer(message: HelperMessage): HelperAnswer {
  if ('task' in message) {
    // What is wrong with a chunk is told by the thread that is helped.
    const { task, shared } = message;
    const memory = createTableMemory(shared);
    work = createTableWork(task, createGridChecks(undefined), memory);
    rooms = shared.rooms.map((room) => memory.bytes(room, roomBytes));
    return 'ready';
  }
  const room = rooms[message.room];
  if (work === null || room === undefined) throw new Error('read-table-thread was given a chunk before its task.');
  return { result: work.readAhead(room.subarray(0, message.length)) };
}

port.on('message', (message: HelperMessage) => {
  try {
    port.postMessage(answer(message));
  } catch (error) {
    port.postMessage({ failed: error instanceof Error ? error.message : String(error) } satisfies HelperAnswer);
  }
});
