import type { BinaryOperation } from './node';

/** Applies one operation row by row. `exponent` is the number where a power has one, else null. */
export function evaluateBinary(
  operation: BinaryOperation, exponent: number | null, a: Float64Array, b: Float64Array, into: Float64Array, rows: number,
): void {
  switch (operation) {
    case 'add':
      for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) + (b[i] as number);
      return;
    case 'subtract':
      for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) - (b[i] as number);
      return;
    case 'multiply':
      for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) * (b[i] as number);
      return;
    case 'divide':
      for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) / (b[i] as number);
      return;
    case 'power':
      raise(exponent, a, b, into, rows);
  }
}

/** Squares and cubes are products: exact to the last digit or two, and several times faster than a general power. */
function raise(exponent: number | null, a: Float64Array, b: Float64Array, into: Float64Array, rows: number): void {
  if (exponent === 2) {
    for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) * (a[i] as number);
  } else if (exponent === 3) {
    for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) * (a[i] as number) * (a[i] as number);
  } else {
    for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) ** (b[i] as number);
  }
}
