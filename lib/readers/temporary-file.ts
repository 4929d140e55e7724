import { randomUUID } from 'node:crypto';
import fs from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { RejectedFile } from './rejected-file';

/** Room that one file may take on the disk of the worker while it is read. */
const mostBytes = 50e9;

/** A file on disk without a name: it is gone once it is closed, also by the end of the process. */
export interface TemporaryFile {
  readonly descriptor: number;
  size(): number;
  /** Writes at the end and returns where. */
  append(bytes: Uint8Array): number;
  /** Fills `into` from `position`; misuse to ask for more than was written. */
  read(into: Uint8Array, position: number): void;
  close(): void;
}

/** Where files that must be read in another order than they arrive wait, in the folder TMPDIR names. Throws RejectedFile where one grows too large. */
export function openTemporaryFile(): TemporaryFile {
  const place = path.join(tmpdir(), `fourfold-${randomUUID()}`);
  const descriptor = fs.openSync(place, 'wx+', 0o600);
  fs.unlinkSync(place);
  let size = 0;
  let isOpen = true;
  return {
    descriptor,
    size: () => size,
    append(bytes) {
      const start = size;
      if (start + bytes.length > mostBytes) throw tooLarge();
      for (let at = 0; at < bytes.length;) {
        const written = fs.writeSync(descriptor, bytes, at, bytes.length - at, size);
        at += written;
        size += written;
      }
      return start;
    },
    read(into, position) {
      for (let at = 0; at < into.length;) {
        const read = fs.readSync(descriptor, into, at, into.length - at, position + at);
        if (read === 0) throw new RangeError(`A temporary file of ${size} bytes was read at ${position + at}.`);
        at += read;
      }
    },
    close() {
      if (isOpen) fs.closeSync(descriptor);
      isOpen = false;
    },
  };
}

/** The pieces of a file, one after another, on disk; it is closed again where they end in an error. */
export async function writeTemporaryFile(pieces: AsyncIterable<Uint8Array>, onPiece: () => void): Promise<TemporaryFile> {
  const file = openTemporaryFile();
  try {
    for await (const piece of pieces) {
      file.append(piece);
      onPiece();
    }
  } catch (error) {
    file.close();
    throw error;
  }
  return file;
}

function tooLarge(): RejectedFile {
  return new RejectedFile([{
    code: 'too-many-values', count: 1, line: null, column: null, found: `more than ${mostBytes / 1e9} GB of numbers`,
    expected: 'a text table with one row per line, which has no such limit',
  }]);
}
