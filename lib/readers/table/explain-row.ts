import { parseNumber, type NumberReading } from '../parse-number';
import type { ReasonCollector } from '../reason-collector';
import { splitFields } from './split-fields';
import type { Delimiter } from '../../domain/columns/given-dialect';

/** The decimal mark of the file and the line it was first seen in. */
export interface DecimalMark { mark: 'point' | 'comma'; line: number }

export interface RowRules {
  delimiter: Delimiter;
  width: number;
  wanted: readonly number[];
  allowComma: boolean;
  /** Most significant digits seen, per wanted column. */
  digits: number[];
  /** Null until a number has one. */
  mark: DecimalMark | null;
  /** Whether it was said beforehand. */
  isMarkGiven: boolean;
  reasons: ReasonCollector;
}

/** A row of the file: bytes[start, end), without white space at its end. */
export interface RowText { bytes: Buffer; start: number; end: number; line: number }

/**
 * Reads a row again that was not plain numbers. True, with the values set, where it is a row after all (quotes, an empty
 * column after the last separator); otherwise everything wrong with it goes to the collector.
 */
export function explainRow(
  rules: RowRules, { bytes, start, end, line }: RowText, columns: readonly Float64Array[], row: number,
): boolean {
  const fields = splitFields(bytes.toString('latin1', start, end), rules.delimiter);
  if (fields.length === rules.width + 1 && fields.at(-1) === '') fields.pop();
  if (fields.length !== rules.width) {
    rules.reasons.add({
      code: fields.length < rules.width ? 'short-row' : 'long-row', line, column: null,
      found: plural(fields.length), expected: plural(rules.width),
    });
    return false;
  }
  let isGood = true;
  for (const [slot, index] of rules.wanted.entries()) {
    const value = readField(rules, fields[index] ?? '', line, index + 1, slot);
    if (value === null) isGood = false;
    else (columns[slot] as Float64Array)[row] = value;
  }
  return isGood;
}

function readField(rules: RowRules, field: string, line: number, column: number, slot: number): number | null {
  if (field === '') {
    rules.reasons.add({ code: 'missing-value', line, column, found: 'nothing', expected: 'a number' });
    return null;
  }
  const bytes = Buffer.from(field, 'latin1');
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  const value = parseNumber(bytes, 0, bytes.length, rules.allowComma, reading);
  if (reading.status !== 'number') {
    rules.reasons.add({ code: reading.status, line, column, found: bytes.toString('utf8'), expected: 'a finite number' });
    return null;
  }
  rules.digits[slot] = Math.max(rules.digits[slot] ?? 0, reading.digits);
  if (reading.mark === 'none') return value;
  rules.mark ??= { mark: reading.mark, line };
  if (reading.mark === rules.mark.mark) return value;
  rules.reasons.add({
    code: 'mixed-decimal', line, column, found: field,
    expected: `a decimal ${rules.mark.mark}, ${rules.isMarkGiven ? 'as said in the columns of the case' : `as from line ${rules.mark.line} on`}`,
  });
  return null;
}

function plural(count: number): string {
  return count === 1 ? '1 column' : `${count} columns`;
}
