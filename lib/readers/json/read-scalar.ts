import { parseNumber, type NumberReading } from '../parse-number';
import type { FoundProblem } from '../reason-collector';
import type { JsonScalar } from './json-structure';

/** A value that stands where a number is wanted. */
export type BadValue = Pick<FoundProblem, 'code' | 'found' | 'expected'>;

export interface ScalarReader {
  /** The number, or NaN where it is none. */
  read(kind: JsonScalar, bytes: Buffer, from: number, to: number): number;
  /** Significant digits of the number read last. */
  digits(): number;
  /** Why the value given is no number. */
  explain(kind: JsonScalar, bytes: Buffer, from: number, to: number): BadValue;
}

const longestShown = 60;

/** Reads scalars of JSON as numbers; texts are none, even where they hold digits. */
export function createScalarReader(): ScalarReader {
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  return {
    read(kind, bytes, from, to) {
      if (kind !== 'number') return NaN;
      const value = parseNumber(bytes, from, to, false, reading);
      return reading.status === 'number' ? value : NaN;
    },
    digits: () => reading.digits,
    explain(kind, bytes, from, to) {
      const text = bytes.toString('utf8', from, Math.min(to, from + longestShown));
      const found = kind === 'string' ? `"${text}"` : text;
      if (text === 'null' && kind === 'word') return { code: 'missing-value', found, expected: 'a number' };
      parseNumber(bytes, from, to, false, reading);
      if (reading.status === 'not-finite') return { code: 'not-finite', found, expected: 'a finite number' };
      return { code: 'not-a-number', found, expected: kind === 'string' ? 'a number without quotes' : 'a number' };
    },
  };
}

export const listAsValue: BadValue = { code: 'not-a-number', found: 'a list', expected: 'a number' };
