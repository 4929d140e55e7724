import type { ColumnEngine } from '../../numerics/column-engine';
import { createEngine, type StepExports } from './column-engine';
import { powersOfFive } from '../powers-of-five';
import { tableRowsModule } from './table-rows.generated';

/** What table-rows/read-rows.ts exports, which says what each does. */
interface RowsExports {
  freeFrom(): number;
  describe(lineEnd: number, separator: number, columns: number, takesComma: number): void;
  place(powers: number, fields: number, slots: number, count: number, lines: number, rows: number): void;
  begin(from: number, lineBefore: number, knownMark: number): void;
  goOn(rows: number): void;
  readRows(end: number, skipped: number): number;
  row: WebAssembly.Global;
  line: WebAssembly.Global;
  at: WebAssembly.Global;
  rowStart: WebAssembly.Global;
  fileMark: WebAssembly.Global;
  markLine: WebAssembly.Global;
}

/** The memory of one table and the code that works in it: what a thread hands to another. */
export interface SharedMemory {
  program: WebAssembly.Module;
  memory: WebAssembly.Memory;
  /** Where memory is free for the other thread. */
  freeFrom: number;
}

export interface TableMemory {
  code: RowsExports;
  engine: ColumnEngine;
  /** Room for so many bytes, on which a vector may begin; all of it is 0. */
  take: (bytes: number) => number;
  column: (length: number) => Float64Array;
  bytes: (at: number, length: number) => Buffer;
  view: (at: number, length: number) => DataView;
  /** Where an array begins, null where it lies elsewhere. */
  addressOf: (array: Float64Array | Int32Array | Uint8Array) => number | null;
  powersAt: number;
  /** For one other thread; from then on no more room can be taken here. */
  share: () => SharedMemory;
}

const pageBytes = 65_536;
/** Four gigabytes, all that an address reaches; what is not used takes nothing. */
const mostPages = 65_536;
const vectorBytes = 16;

let compiled: WebAssembly.Module | null = null;

/**
 * Memory in which rows are read and columns worked on, by code compiled from table-rows/. It can be seen by two threads,
 * each with room of its own in it, so that neither copies what the other has received.
 */
export function createTableMemory(shared?: SharedMemory): TableMemory {
  compiled ??= shared?.program ?? new WebAssembly.Module(Buffer.from(tableRowsModule, 'base64'));
  const program = compiled;
  const memory = shared?.memory ?? new WebAssembly.Memory({ initial: 1, maximum: mostPages, shared: true });
  const { exports } = new WebAssembly.Instance(program, { env: { memory, sine: Math.sin, cosine: Math.cos, exponential: Math.exp } });
  const code = exports as unknown as RowsExports & StepExports;
  // A memory that has grown is seen through a new buffer; the old ones still lie in it.
  const buffers = new Set<ArrayBufferLike>();
  let end = shared?.freeFrom ?? code.freeFrom();
  let isShared = false;

  const take = (bytes: number) => {
    if (isShared) throw new Error('createTableMemory: no room can be taken once the memory is shared');
    const at = Math.ceil(end / vectorBytes) * vectorBytes;
    end = at + bytes;
    const missing = end - memory.buffer.byteLength;
    if (missing > 0) memory.grow(Math.ceil(missing / pageBytes));
    buffers.add(memory.buffer);
    return at;
  };
  const column = (length: number) => {
    const at = take(length * 8);
    return new Float64Array(memory.buffer, at, length);
  };
  const addressOf = (array: Float64Array | Int32Array | Uint8Array) => (buffers.has(array.buffer) ? array.byteOffset : null);

  const powers = powersOfFive();
  const powersAt = take(powers.length);
  new Uint8Array(memory.buffer).set(powers, powersAt);
  return {
    code, take, column, addressOf, powersAt,
    engine: createEngine(code, { column, addressOf }),
    bytes: (at, length) => Buffer.from(memory.buffer, at, length),
    view: (at, length) => new DataView(memory.buffer, at, length),
    share() {
      isShared = true;
      return { program, memory, freeFrom: end };
    },
  };
}
