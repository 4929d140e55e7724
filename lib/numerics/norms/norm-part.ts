import type { Position } from '../assessment';

/** A sum and what its additions rounded away. */
export interface SumPart { sum: number; lost: number }

export const sumNames = ['absolute', 'square', 'signed', 'exactAbsolute', 'exactSquare'] as const;

/** What norms of one field are made of, over some of the rows. */
export interface FieldPart extends Record<(typeof sumNames)[number], SumPart> {
  largest: number;
  at: Position;
  exactLargest: number;
  min: number;
  max: number;
}

/** What norms are made of, over some of the rows: plain data, which a thread can hand to another. */
export interface NormPart {
  rows: number;
  equalWeights: boolean;
  weights: SumPart;
  /** In the order of the fields. */
  fields: FieldPart[];
}
