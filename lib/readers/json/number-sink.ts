import type { StoredColumn } from '../column-store';
import { parseNumber, type NumberReading } from '../parse-number';
import type { ReasonCollector } from '../reason-collector';
import type { ColumnSink } from './json-columns';

/** Takes the values of one column, which counts from 1; NaN stands for what is no number, with its reason. */
export function createNumberSink(values: StoredColumn, column: number, reasons: ReasonCollector): { sink: ColumnSink; digits: () => number } {
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  let most = 0;
  return {
    digits: () => most,
    sink(kind, bytes, from, to, line, row) {
      const value = kind === 'list' ? NaN : parseNumber(bytes, from, to, false, reading);
      if (kind === 'number' && reading.status === 'number') {
        values.add(value);
        if (reading.digits > most) most = reading.digits;
        return;
      }
      values.add(NaN);
      const text = kind === 'list' ? 'a list' : bytes.toString('utf8', from, to);
      const shown = `${kind === 'string' ? `"${text}"` : text} in row ${row + 1}`;
      const place = { line: line || null, column, found: shown };
      if (text === 'null') reasons.add({ code: 'missing-value', ...place, expected: 'a number' });
      else if (kind !== 'list' && reading.status === 'not-finite') reasons.add({ code: 'not-finite', ...place, expected: 'a finite number' });
      else reasons.add({ code: 'not-a-number', ...place, expected: kind === 'string' ? 'a number without quotes' : 'a number' });
    },
  };
}
