import type { Operands } from './expression/evaluate-binary';
import type { BinaryOperation, UnaryOperation } from './expression/node';

/** The columns of one field: values of the file, the exact ones, and weights, null where every row weighs the same. */
export interface ErrorColumns {
  values: Float64Array;
  exact: Float64Array;
  weights: Float64Array | null;
}

/**
 * Works on columns that lie in memory of its own, faster than loops of the language do and to the same result. Each
 * operation answers whether it was done: not where it is not known there, or a column lies elsewhere.
 */
export interface ColumnEngine {
  /** So many doubles in that memory, all of them 0. */
  allocate(length: number): Float64Array;
  unary(operation: UnaryOperation, from: Float64Array, into: Float64Array, rows: number): boolean;
  binary(operation: BinaryOperation, operands: Operands, into: Float64Array, rows: number): boolean;
  /** Copies the rows whose places are given; those, too, lie in its memory. */
  pick(from: Float64Array, places: Int32Array, into: Float64Array, rows: number): boolean;
  /** As addErrors in norms/run-sums.ts. */
  addErrors(state: Float64Array, columns: ErrorColumns, rows: number): boolean;
  /** As addWeights in norms/run-sums.ts. */
  addWeights(state: Float64Array, weights: Float64Array, rows: number): boolean;
}
