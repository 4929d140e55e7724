import type { ExpansionLimit } from '../expansion-limit';
import { createBlockInflater, type BlockInflater } from './block-inflater';

/** Throws what rejects the file, with the place and the array. */
export type Fail = (found: string, expected: string) => never;

export interface PayloadForm {
  /** Bytes of each length before the data: 4 or 8. */
  lengthBytes: 4 | 8;
  littleEndian: boolean;
  isCompressed: boolean;
  /** Watches what comes out of compressed blocks. */
  expansion: ExpansionLimit;
}

export interface ArrayPayload {
  /** Takes what belongs to the array and leaves what comes after its end. */
  push(bytes: Uint8Array): Promise<void> | void;
  /** Rejects where something is missing. */
  end(): void;
  isDone(): boolean;
  /** Bytes that came after its end. */
  surplus(): number;
  drop(): void;
}

/** Lengths of blocks that are held at once. */
const mostBlocks = 4 * 1024 * 1024;

/**
 * The data of an array as VTK writes it: its length in bytes before it, or, compressed, the number of blocks, the length of a
 * block and of a shorter last one (0 for none), and the packed length of each, before the blocks.
 */
export function createArrayPayload(form: PayloadForm, onBytes: (bytes: Uint8Array) => void, fail: Fail): ArrayPayload {
  return form.isCompressed ? packedPayload(form, onBytes, fail) : plainPayload(form, onBytes, fail);
}

/** Collects lengths, cut anywhere. */
function createLengthReader({ lengthBytes, littleEndian }: PayloadForm): { take(bytes: Uint8Array, from: number): number; value(): number | null } {
  const room = new Uint8Array(lengthBytes);
  const view = new DataView(room.buffer);
  let held = 0;
  return {
    take(bytes, from) {
      let at = from;
      for (; at < bytes.length && held < lengthBytes; at += 1) {
        room[held] = bytes[at] as number;
        held += 1;
      }
      return at;
    },
    value() {
      if (held < lengthBytes) return null;
      held = 0;
      return lengthBytes === 4 ? view.getUint32(0, littleEndian) : Number(view.getBigUint64(0, littleEndian));
    },
  };
}

function plainPayload(form: PayloadForm, onBytes: (bytes: Uint8Array) => void, fail: Fail): ArrayPayload {
  const lengths = createLengthReader(form);
  let length = -1;
  let taken = 0;
  let surplus = 0;
  return {
    push(bytes) {
      let at = 0;
      if (length < 0) {
        at = lengths.take(bytes, 0);
        length = lengths.value() ?? -1;
      }
      const some = length < 0 ? 0 : Math.min(bytes.length - at, length - taken);
      surplus += bytes.length - at - some;
      if (some === 0) return;
      onBytes(bytes.subarray(at, at + some));
      taken += some;
    },
    end() {
      if (length < 0) fail('the end', 'the length of its data');
      if (taken < length) fail(`the end after ${taken} bytes`, `${length} bytes`);
    },
    isDone: () => taken === length,
    surplus: () => surplus,
    drop: () => undefined,
  };
}

function packedPayload(form: PayloadForm, onBytes: (bytes: Uint8Array) => void, fail: Fail): ArrayPayload {
  const lengths = createLengthReader(form);
  const header: number[] = [];
  let block = 0;
  let left = 0;
  let out = 0;
  let surplus = 0;
  let inflater: BlockInflater | null = null;
  const [blocks, whole, last] = [() => header[0] ?? 0, () => header[1] ?? 0, () => header[2] ?? 0];
  const isHeaderRead = () => header.length >= 3 && header.length === 3 + blocks();
  const isDone = () => isHeaderRead() && block === blocks();
  const unpackedLength = () => (block === blocks() - 1 && last() > 0 ? last() : whole());

  const readHeader = (bytes: Uint8Array, from: number): number => {
    let at = from;
    while (at < bytes.length && !isHeaderRead()) {
      at = lengths.take(bytes, at);
      const value = lengths.value();
      if (value === null) break;
      header.push(value);
      if (header.length === 1 && value > mostBlocks) fail(`${value} blocks`, `at most ${mostBlocks} blocks`);
    }
    return at;
  };

  const begin = (): BlockInflater => {
    const [packed, unpacked] = [header[3 + block] ?? 0, unpackedLength()];
    left = packed;
    out = 0;
    return createBlockInflater({ packed, unpacked }, (bytes) => {
      out += bytes.length;
      if (out > unpacked) fail(`more than ${unpacked} bytes out of block ${block + 1}`, `${unpacked} bytes`);
      form.expansion.noteExpanded(bytes.length);
      onBytes(bytes);
    });
  };

  const finish = async (current: BlockInflater): Promise<void> => {
    try {
      await current.end();
    } catch (error) {
      refuseDamage(error);
    }
    if (out !== unpackedLength()) fail(`${out} bytes out of block ${block + 1}`, `${unpackedLength()} bytes`);
    inflater = null;
    block += 1;
  };

  const refuseDamage = (error: unknown): void => {
    if (!(error instanceof Error && 'code' in error && typeof error.code === 'string' && /^(?:Z_|ERR_BUFFER_TOO_LARGE)/.test(error.code))) throw error;
    fail(`block ${block + 1}, which does not unpack (${error.message})`, `${unpackedLength()} bytes packed by zlib`);
  };

  return {
    async push(bytes) {
      let at = readHeader(bytes, 0);
      while (isHeaderRead() && block < blocks()) {
        inflater ??= begin();
        const some = Math.min(left, bytes.length - at);
        if (some === 0 && left > 0) return;
        try {
          await inflater.push(bytes.subarray(at, at + some));
        } catch (error) {
          refuseDamage(error);
        }
        at += some;
        left -= some;
        if (left === 0) await finish(inflater);
      }
      surplus += bytes.length - at;
    },
    end() {
      if (!isHeaderRead()) fail('the end', 'the lengths of its blocks');
      if (!isDone()) fail(`the end in block ${block + 1}`, `${blocks()} blocks`);
    },
    isDone,
    surplus: () => surplus,
    drop: () => inflater?.drop(),
  };
}
