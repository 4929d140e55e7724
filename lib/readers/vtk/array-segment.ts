import { createBase64Reader, createRawReader, createTextReader, type ArrayReader, type ArrayTarget } from './array-reader';
import type { Fail, PayloadForm } from './array-payload';
import type { StoredArray } from './grid-file';
import type { ValueType } from './value-type';

export type Encoding = 'ascii' | 'inline base64' | 'appended base64' | 'appended raw';

export interface SegmentAsked {
  piece: number;
  type: ValueType;
  encoding: Encoding;
  form: PayloadForm;
  /** Values of the whole of it, null where that is not known. */
  expected: number | null;
  /** Values that are kept, of the first on. */
  keep: number;
  fail: Fail;
}

/** Reads the values of one piece into an array; reading is done once as many as are to be kept were read. */
export function openSegment(array: StoredArray, { piece, type, encoding, form, expected, keep, fail }: SegmentAsked): ArrayReader {
  const segment = { from: array.values.length(), length: 0 };
  array.segments[piece] = segment;
  let length = 0;
  const isFull = () => length >= keep;
  const target: ArrayTarget & { isAppended: boolean } = {
    isAppended: encoding !== 'inline base64',
    onValues(values, count) {
      if (expected !== null && length + count > expected) fail(`more than ${expected} values`, `${expected}`);
      const kept = Math.min(count, keep - length);
      length += count;
      if (kept <= 0) return;
      array.values.addAll(values, kept);
      segment.length += kept;
    },
    onWord(text, line, ahead) {
      if (array.word === null) array.word = { text, line, row: Math.floor((array.values.length() + ahead) / array.components), count: 1 };
      else array.word.count += 1;
    },
    onDigits(digits) {
      if (array.digits !== null) array.digits = Math.max(array.digits, digits);
    },
    fail,
  };
  if (encoding !== 'ascii') {
    array.digits = null;
    array.isSingle ||= type.name === 'Float32';
  }
  const reader = openReader(target, { type, encoding, form });
  return {
    push: (bytes, from, to, lineAt) => (isFull() ? undefined : reader.push(bytes, from, to, lineAt)),
    async end() {
      if (isFull() && keep < (expected ?? Infinity)) return reader.drop();
      await reader.end();
      if (expected !== null && length !== expected) fail(`${length} values`, `${expected}`);
    },
    isDone: () => isFull() || reader.isDone(),
    drop: () => reader.drop(),
  };
}

function openReader(target: ArrayTarget & { isAppended: boolean }, { type, encoding, form }: Pick<SegmentAsked, 'type' | 'encoding' | 'form'>): ArrayReader {
  switch (encoding) {
    case 'ascii': return createTextReader(target);
    case 'appended raw': return createRawReader(type, form, target);
    case 'inline base64':
    case 'appended base64': return createBase64Reader(type, form, target);
  }
}
