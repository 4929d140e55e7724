import type { ColumnsAsked, ColumnsFound } from '../column-format';
import { deliverColumns, type ColumnStore, type StoredColumn } from '../column-store';
import { resolveColumn } from '../../domain/columns/resolve-column';
import { locateColumns } from '../locate-columns';
import type { ColumnSink } from './column-arrays';
import { listAsValue, type BadValue, type ScalarReader } from './read-scalar';

interface StoredNumbers { values: StoredColumn; digits: number }

export interface StoredColumns {
  /** The sink of a column that may be wanted, which counts from 1. */
  begin: (name: string, column: number) => ColumnSink | null;
  /** Delivers the columns, once all are there. */
  finish(header: readonly string[]): ColumnsFound;
}

/** Keeps the wanted columns of a document until their last has come. */
export function createStoredColumns(store: ColumnStore, reader: ScalarReader, { wanted, reasons, onBatch, onPiece }: ColumnsAsked): StoredColumns {
  const stored = new Map<number, StoredNumbers>();
  return {
    begin(name, column) {
      if (!wanted.some((each) => resolveColumn([name], each) === 0)) return null;
      const own: StoredNumbers = { values: store.addColumn(), digits: 0 };
      stored.set(column - 1, own);
      const refuse = ({ found, ...bad }: BadValue, line: number) => {
        reasons.add({ ...bad, found: `${found} in row ${own.values.length() + 1}`, line, column });
        own.values.add(NaN);
      };
      return {
        scalar(kind, bytes, from, to, line) {
          const value = reader.read(kind, bytes, from, to);
          if (Number.isNaN(value)) refuse(reader.explain(kind, bytes, from, to), line);
          else {
            own.values.add(value);
            if (reader.digits() > own.digits) own.digits = reader.digits();
          }
        },
        nested: (line) => refuse(listAsValue, line),
      };
    },
    finish(header) {
      const indices = locateColumns(header, wanted, 1, reasons);
      const found = indices.map((index) => stored.get(index));
      const lengths = found.map((each) => each?.values.length() ?? 0);
      const rows = lengths[0] ?? 0;
      for (const [slot, length] of lengths.entries()) {
        if (length === rows) continue;
        reasons.add({
          code: 'column-length', line: null, column: (indices[slot] ?? 0) + 1, found: `${length} values`,
          expected: `${rows} values, as in ${wanted[0] ?? 'the first column'}`,
        });
      }
      reasons.throwIfAny();
      deliverColumns(found.flatMap((each) => each?.values ?? []), rows, (batch) => {
        onBatch(batch);
        onPiece();
      });
      return { columns: found.map((each, slot) => ({ index: indices[slot] ?? 0, significantDigits: each?.digits ?? 0 })) };
    },
  };
}
