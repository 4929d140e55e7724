import type { ColumnsAsked, ColumnsFound } from '../column-format';
import { resolveColumn } from '../../domain/columns/resolve-column';
import { createJsonColumns, type ColumnSink } from './json-columns';
import { locateColumns } from '../locate-columns';
import { createNumberSpool, type NumberSpool } from './number-spool';
import { parseNumber, type NumberReading } from '../parse-number';
import { rejectAtOnce, type ReasonCollector } from '../reason-collector';
import type { ColumnBatch } from '../source';

const batchRows = 2048;
/** Columns arrive one after another, so all their numbers are held: 32 MB of them. */
const mostNumbers = 4_000_000;

/** Reads columns from JSON. Memory grows with the rows here, up to a limit beyond which the file is rejected. */
export async function readJson(pieces: AsyncIterable<Buffer>, { wanted, reasons, onBatch, onPiece }: ColumnsAsked): Promise<ColumnsFound> {
  const spools = new Map<number, NumberSpool>();
  let held = 0;
  const columns = createJsonColumns((name, column) => {
    if (!wanted.some((each) => resolveColumn([name], each) === 0)) return null;
    const spool = createNumberSpool();
    spools.set(column - 1, spool);
    return spoolSink(spool, column, reasons, (line) => {
      held += 1;
      if (held > mostNumbers) {
        rejectAtOnce(reasons, {
          code: 'too-many-values', line, column: null, found: `more than ${mostNumbers} numbers`, expected: 'a text table, which has no such limit',
        });
      }
    });
  }, reasons);

  for await (const piece of pieces) {
    columns.push(piece);
    onPiece();
  }
  columns.end();
  const header = columns.header();
  const indices = locateColumns(header, wanted, 1, reasons);
  const found = indices.map((index) => spools.get(index) ?? createNumberSpool());
  const rows = found[0]?.length() ?? 0;
  for (const [slot, spool] of found.entries()) {
    if (spool.length() === rows) continue;
    reasons.add({
      code: 'column-length', line: null, column: (indices[slot] ?? 0) + 1, found: `${spool.length()} values`,
      expected: `${rows} values, as in ${wanted[0] ?? 'the first column'}`,
    });
  }
  reasons.throwIfAny();
  deliver(found, rows, (batch) => {
    onBatch(batch);
    onPiece();
  });
  return { columns: found.map((spool, slot) => ({ index: indices[slot] ?? 0, significantDigits: spool.digits() })) };
}

function deliver(spools: readonly NumberSpool[], rows: number, onBatch: (batch: ColumnBatch) => void): void {
  const batch = spools.map(() => new Float64Array(batchRows));
  for (let from = 0; from < rows; from += batchRows) {
    const count = Math.min(batchRows, rows - from);
    for (const [slot, spool] of spools.entries()) spool.copy(from, count, batch[slot] as Float64Array);
    onBatch({ rows: count, columns: batch, lines: null });
  }
}

function spoolSink(spool: NumberSpool, column: number, reasons: ReasonCollector, count: (line: number) => void): ColumnSink {
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  return (kind, bytes, from, to, line, row) => {
    count(line);
    const value = kind === 'list' ? NaN : parseNumber(bytes, from, to, false, reading);
    if (kind === 'number' && reading.status === 'number') {
      spool.add(value, reading.digits);
      return;
    }
    spool.add(NaN, 0);
    const text = kind === 'list' ? 'a list' : bytes.toString('utf8', from, to);
    const shown = `${kind === 'string' ? `"${text}"` : text} in row ${row + 1}`;
    const place = { line: line || null, column, found: shown };
    if (text === 'null') reasons.add({ code: 'missing-value', ...place, expected: 'a number' });
    else if (kind !== 'list' && reading.status === 'not-finite') reasons.add({ code: 'not-finite', ...place, expected: 'a finite number' });
    else reasons.add({ code: 'not-a-number', ...place, expected: kind === 'string' ? 'a number without quotes' : 'a number' });
  };
}
