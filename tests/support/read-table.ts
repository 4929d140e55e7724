import { readColumns } from '@/lib/readers/read-columns';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { byteSource } from './byte-source';

export interface ReadTable { columns: number[][]; lines: (number | null)[]; digits: (number | null)[] }

/** Reads whole columns, as nobody but a test should. */
export async function readTable(content: string | Uint8Array, names: string[], cuts: readonly number[] = []): Promise<ReadTable> {
  const columns: number[][] = names.map(() => []);
  const lines: (number | null)[] = [];
  const { digits } = await readColumns(byteSource(content, cuts), {
    names,
    onBatch(batch) {
      for (let i = 0; i < batch.rows; i += 1) lines.push(batch.lines?.[i] ?? null);
      for (const [slot, column] of batch.columns.entries()) columns[slot]?.push(...column.subarray(0, batch.rows));
    },
  });
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
