/** A float32 has a mantissa of 24 bits. */
const singleBits = 24;

interface StoredColumn {
  /** Largest |q| in the column. */
  largest: number;
  /** Most significant digits seen in the column over all grids; null where the file prints none. */
  significantDigits: number | null;
  precision?: 'double' | 'single';
}

/**
 * Known error δ of a norm: half a unit of what the column was stored with, ½·10^(⌊log10 max|q|⌋ − s + 1) for s printed
 * digits (half a unit of float32 where so stored), plus the iterative error stated for the norm, in the norm's unit.
 *
 * A column of zeros or without printed digits adds nothing. Throws where an argument is negative or not finite.
 */
export function knownError({ largest, significantDigits, precision = 'double' }: StoredColumn, iterativeError = 0): number {
  if (!(largest >= 0 && Number.isFinite(largest))) throw new RangeError(`largest must be 0 or above, got ${largest}`);
  if (!(iterativeError >= 0 && Number.isFinite(iterativeError))) throw new RangeError(`iterativeError must be 0 or above, got ${iterativeError}`);
  if (largest === 0) return iterativeError;
  const printed = significantDigits === null ? 0 : 0.5 * 10 ** (decimalExponent(largest) - significantDigits + 1);
  const single = precision === 'single' ? 0.5 * 2 ** (Math.floor(Math.log2(largest)) - singleBits + 1) : 0;
  return Math.max(printed, single) + iterativeError;
}

function decimalExponent(value: number): number {
  return Number(value.toExponential().split('e')[1]);
}
