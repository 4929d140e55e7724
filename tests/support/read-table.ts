import { createGridChecks } from '@/lib/readers/grid-checks';
import { locateColumns } from '@/lib/readers/locate-columns';
import { createChunkReader } from '@/lib/readers/table/read-chunk';
import { readChunks } from '@/lib/readers/table/read-chunks';
import { readSource } from '@/lib/readers/read-source';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { ColumnBatch } from '@/lib/readers/source';
import { detectTableDialect } from '@/lib/readers/table/table-dialect';
import { byteSource } from './byte-source';

export interface ReadTable { columns: number[][]; lines: (number | null)[]; digits: (number | null)[] }

/** Reads whole columns, as nobody but a test should. */
export async function readTable(content: string | Uint8Array, names: string[], cuts: readonly number[] = []): Promise<ReadTable> {
  const columns: number[][] = names.map(() => []);
  const lines: (number | null)[] = [];
  const checks = createGridChecks(undefined);
  const onBatch = (batch: ColumnBatch) => {
    for (let i = 0; i < batch.rows; i += 1) lines.push(batch.lines?.[i] ?? null);
    for (const [slot, column] of batch.columns.entries()) columns[slot]?.push(...column.subarray(0, batch.rows));
  };
  const digits = await readSource<(number | null)[]>(byteSource(content, cuts), {
    async columns(reader, { pieces }) {
      const read = await reader.read(pieces, { wanted: names, reasons: checks.rows, onBatch, onPiece: () => undefined });
      return read.columns.map(({ significantDigits }) => significantDigits);
    },
    table({ pieces, head }) {
      const dialect = detectTableDialect(head);
      const reader = createChunkReader({ dialect, wanted: locateColumns(dialect.header, names, dialect.headerLine, checks.rows) });
      const work = {
        read: (bytes: Uint8Array, start: Parameters<typeof reader.read>[1]) => (
          { part: null, ...reader.read(bytes, start, checks.rows, onBatch), digits: reader.significantDigits() }
        ),
        readAhead: () => null,
      };
      return readChunks(pieces, { dialect, work, checks, onPart: () => undefined });
    },
  });
  if (lines.length === 0 && checks.isClean()) checks.rows.add({ code: 'too-few-rows', line: null, column: null, found: null, expected: null });
  checks.throwIfAny(undefined);
  return { columns, lines, digits };
}

/** The reasons for which a file is rejected; empty where it is taken. */
export async function readReasons(content: string | Uint8Array, names: string[], cuts: readonly number[] = []) {
  try {
    await readTable(content, names, cuts);
    return [];
  } catch (error) {
    if (error instanceof RejectedFile) return error.reasons;
    throw error;
  }
}
