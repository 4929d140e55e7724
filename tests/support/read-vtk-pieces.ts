import { createReasonCollector } from '@/lib/readers/reason-collector';
import { vtkFormat } from '@/lib/readers/vtk/vtk-format';
import { byteSource } from './byte-source';

/** Reads columns with the bytes cut as given: otherwise the beginning of a file comes in one piece. */
export async function readVtkPieces(bytes: Uint8Array, wanted: string[], cuts: readonly number[]): Promise<number[][]> {
  const columns: number[][] = wanted.map(() => []);
  await vtkFormat.read(pieces(bytes, cuts), {
    wanted, reasons: createReasonCollector(), onPiece: () => undefined,
    onBatch(batch) {
      for (const [slot, column] of batch.columns.entries()) columns[slot]?.push(...column.subarray(0, batch.rows));
    },
  });
  return columns;
}

/** Each piece in a buffer that is written over afterwards, as a source that uses its own again. */
async function* pieces(bytes: Uint8Array, cuts: readonly number[]): AsyncGenerator<Buffer> {
  for await (const piece of byteSource(bytes, cuts)) {
    const lent = Buffer.from(piece);
    yield lent;
    lent.fill(0x3c);
  }
}
