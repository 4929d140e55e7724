import type { RejectionCode } from '../../domain/uploads/rejection';

/** Centres, measures and sizes along the axes of cells that follow each other. */
export interface CellBatch { x: Float64Array; y: Float64Array; z: Float64Array; volume: Float64Array; dx: Float64Array; dy: Float64Array; dz: Float64Array }

/** Computes cells of one piece, in turn. */
export interface CellRows { fill(from: number, count: number, into: CellBatch): void }

/** Throws what rejects the file; cells are counted from 1. */
export type RefuseCell = (code: RejectionCode, found: string, expected: string) => never;

export function createCellBatch(rows: number): CellBatch {
  const column = () => new Float64Array(rows);
  return { x: column(), y: column(), z: column(), volume: column(), dx: column(), dy: column(), dz: column() };
}
