import type { ValueType } from './value-type';

const batch = 4096;

export interface ValueReader {
  push(bytes: Uint8Array): void;
  /** Bytes of a value that has not arrived whole. */
  rest(): number;
}

/** Turns bytes, cut anywhere, into numbers; the array handed on is used again. */
export function createValueReader(type: ValueType, littleEndian: boolean, onValues: (values: Float64Array, count: number) => void): ValueReader {
  const values = new Float64Array(batch);
  const split = new Uint8Array(8);
  const splitView = new DataView(split.buffer);
  let held = 0;
  return {
    push(bytes) {
      let at = 0;
      if (held > 0) {
        while (held < type.bytes && at < bytes.length) {
          split[held] = bytes[at] as number;
          held += 1;
          at += 1;
        }
        if (held < type.bytes) return;
        type.read(splitView, 1, littleEndian, values);
        onValues(values, 1);
        held = 0;
      }
      while (bytes.length - at >= type.bytes) {
        const count = Math.min(batch, Math.floor((bytes.length - at) / type.bytes));
        type.read(new DataView(bytes.buffer, bytes.byteOffset + at, count * type.bytes), count, littleEndian, values);
        onValues(values, count);
        at += count * type.bytes;
      }
      for (; at < bytes.length; at += 1) {
        split[held] = bytes[at] as number;
        held += 1;
      }
    },
    rest: () => held,
  };
}
