import { parseNumber, type NumberReading } from '../parse-number';
import { createArrayPayload, type ArrayPayload, type Fail, type PayloadForm } from './array-payload';
import { createBase64Decoder } from './base64-bytes';
import { createValueReader } from './value-reader';
import type { ValueType } from './value-type';

export type LineAt = (at: number) => number;

/** Reads the values of one array from where they stand in the file, cut anywhere. */
export interface ArrayReader {
  push(bytes: Buffer, from: number, to: number, lineAt: LineAt): Promise<void> | void;
  end(): Promise<void> | void;
  /** Whether bytes to come are none of its own. */
  isDone(): boolean;
  drop(): void;
}

export interface ArrayTarget {
  /** The array is used again for the next values. */
  onValues(values: Float64Array, count: number): void;
  /** Told of text that is no number, in the place of the value `ahead` of those handed on; a NaN follows for it. */
  onWord(text: string, line: number, ahead: number): void;
  /** Told the most significant digits of a number written in decimal. */
  onDigits(digits: number): void;
  fail: Fail;
}

const batch = 4096;
const longestWord = 200;

/** Numbers as text, between blanks. */
export function createTextReader(target: ArrayTarget): ArrayReader {
  const values = new Float64Array(batch);
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  let filled = 0;
  let most = 0;
  let carry: Buffer = Buffer.alloc(0);
  let line = 1;

  const refuseWord = () => target.fail(`a word of more than ${longestWord} characters`, 'numbers between blanks');
  const take = (bytes: Buffer, from: number, to: number, lineAt: LineAt) => {
    if (to - from > longestWord) refuseWord();
    if (filled === batch) {
      target.onValues(values, filled);
      filled = 0;
    }
    const value = parseNumber(bytes, from, to, false, reading);
    if (reading.status === 'not-a-number') target.onWord(bytes.toString('utf8', from, to), lineAt(from), filled);
    else if (reading.digits > most) most = reading.digits;
    values[filled] = value;
    filled += 1;
  };

  return {
    push(bytes, from, to, lineAt) {
      let at = from;
      if (carry.length > 0) {
        while (at < to && (bytes[at] as number) > 32) at += 1;
        carry = Buffer.concat([carry, bytes.subarray(from, at)]);
        if (carry.length > longestWord) refuseWord();
        if (at === to) return;
        take(carry, 0, carry.length, () => lineAt(from));
        carry = Buffer.alloc(0);
      }
      while (at < to) {
        if ((bytes[at] as number) <= 32) {
          at += 1;
          continue;
        }
        let stop = at + 1;
        while (stop < to && (bytes[stop] as number) > 32) stop += 1;
        if (stop === to) {
          // A copy: the source may use its buffer again.
          carry = Buffer.from(bytes.subarray(at, stop));
          line = lineAt(at);
        } else take(bytes, at, stop, lineAt);
        at = stop;
      }
    },
    end() {
      if (carry.length > 0) take(carry, 0, carry.length, () => line);
      target.onValues(values, filled);
      target.onDigits(most);
    },
    isDone: () => false,
    drop: () => undefined,
  };
}

/** Numbers as bytes, after their lengths. */
export function createRawReader(type: ValueType, form: PayloadForm, target: ArrayTarget): ArrayReader & Pick<ArrayPayload, 'surplus'> {
  const values = createValueReader(type, form.littleEndian, (read, count) => target.onValues(read, count));
  const payload = createArrayPayload(form, (bytes) => values.push(bytes), target.fail);
  return {
    push: (bytes, from, to) => payload.push(bytes.subarray(from, to)),
    end() {
      payload.end();
      if (values.rest() > 0) target.fail(`${values.rest()} bytes beyond the last number`, `a whole number of ${type.name}`);
    },
    isDone: () => payload.isDone(),
    surplus: () => payload.surplus(),
    drop: () => payload.drop(),
  };
}

/** The same in base64. Appended, other arrays follow it at once; inline, nothing does. */
export function createBase64Reader(type: ValueType, form: PayloadForm, target: ArrayTarget & { isAppended: boolean }): ArrayReader {
  const raw = createRawReader(type, form, target);
  const decoder = createBase64Decoder();
  return {
    async push(text, from, to) {
      for (let at = from; at < to && !(target.isAppended && raw.isDone());) {
        at = decoder.decode(text, at, to);
        const isWrong = at < 0;
        if (isWrong) at = -1 - at;
        const bytes = decoder.bytes();
        await raw.push(bytes, 0, bytes.length, () => 0);
        if (isWrong && !raw.isDone()) target.fail(`“${String.fromCodePoint(text[at] as number)}” in base64`, 'letters, digits, “+”, “/” and “=” at ends');
        if (isWrong) return;
      }
    },
    end() {
      if (!raw.isDone() && !decoder.isComplete()) target.fail('the end within base64', 'groups of four characters');
      if (!target.isAppended && raw.surplus() > 0) target.fail('more data than its length says', 'the end of the array');
      return raw.end();
    },
    isDone: () => raw.isDone(),
    drop: () => raw.drop(),
  };
}
