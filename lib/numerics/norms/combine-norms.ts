import { createCompensatedSum, type CompensatedSum } from './compensated-sum';
import type { FieldNorms, GridNorms } from './grid-norms';
import { sumNames, type FieldPart, type NormPart } from './norm-part';

export interface NormTotal {
  /** Parts in the order of their rows: of several equal largest errors the first has its place named. */
  add(part: NormPart): void;
  rows(): number;
  /** Digits per field, null where unknown. Null where there were no rows. */
  finish(significantDigits: readonly (number | null)[]): GridNorms | null;
}

type FieldTotal = Record<(typeof sumNames)[number], CompensatedSum> & Pick<FieldPart, 'largest' | 'at' | 'exactLargest' | 'min' | 'max'>;

/**
 * Puts parts together into the norms of a grid. Parts of the same rows give the same bits, whoever gathered them: sums are
 * added in the order in which the parts come, and compensated.
 */
export function createNormTotal(fields: readonly string[]): NormTotal {
  const weights = createCompensatedSum();
  const totals = fields.map(startTotal);
  let rows = 0;
  let equalWeights = true;
  return {
    add(part) {
      if (part.rows === 0) return;
      rows += part.rows;
      equalWeights = part.equalWeights;
      weights.addPart(part.weights);
      for (const [index, total] of totals.entries()) addField(total, part.fields[index]);
    },
    rows: () => rows,
    finish(significantDigits) {
      if (rows === 0) return null;
      const weightSum = equalWeights ? rows : weights.value();
      const norms = totals.map((total, index) => ({
        field: fields[index] as string, ...divide(total, weightSum), count: rows, significantDigits: significantDigits[index] ?? null,
      }));
      return { rows, weightSum, equalWeights, fields: norms };
    },
  };
}

function startTotal(): FieldTotal {
  return {
    absolute: createCompensatedSum(), square: createCompensatedSum(), signed: createCompensatedSum(),
    exactAbsolute: createCompensatedSum(), exactSquare: createCompensatedSum(),
    largest: -1, at: { x: NaN }, exactLargest: 0, min: Infinity, max: -Infinity,
  };
}

function addField(total: FieldTotal, part: FieldPart | undefined): void {
  if (part === undefined) throw new TypeError('createNormTotal: a part has fewer fields than there are');
  for (const name of sumNames) total[name].addPart(part[name]);
  if (part.largest > total.largest) {
    total.largest = part.largest;
    total.at = part.at;
  }
  total.exactLargest = Math.max(total.exactLargest, part.exactLargest);
  total.min = Math.min(total.min, part.min);
  total.max = Math.max(total.max, part.max);
}

/** √(square/weightSum); by the two roots where the quotient is beyond a double, as with weights of 1e−310 and errors of 1e200. */
function rootOfMean(square: number, weightSum: number): number {
  const mean = square / weightSum;
  return mean === Infinity ? Math.sqrt(square) / Math.sqrt(weightSum) : Math.sqrt(mean);
}

function divide(total: FieldTotal, weightSum: number): Omit<FieldNorms, 'field' | 'count' | 'significantDigits'> {
  const { at, min, max } = total;
  return {
    L1: total.absolute.value() / weightSum,
    L2: rootOfMean(total.square.value(), weightSum),
    Linf: total.largest,
    at,
    mean: total.signed.value() / weightSum,
    exact: {
      L1: total.exactAbsolute.value() / weightSum, L2: rootOfMean(total.exactSquare.value(), weightSum), Linf: total.exactLargest,
    },
    min, max, maxAbs: Math.max(Math.abs(min), Math.abs(max)),
  };
}
