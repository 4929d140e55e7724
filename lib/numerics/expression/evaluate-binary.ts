import type { BinaryOperation } from './node';

/** The columns an operation takes, and the number that stands in all rows of one of them, null where it varies. */
export interface Operands {
  a: Float64Array;
  b: Float64Array;
  aNumber: number | null;
  bNumber: number | null;
}

/** Applies one operation row by row. */
export function evaluateBinary(operation: BinaryOperation, { a, b, aNumber, bNumber }: Operands, into: Float64Array, rows: number): void {
  switch (operation) {
    case 'add':
      // The graph puts numbers first where the order does not matter.
      if (aNumber !== null) addNumber(aNumber, b, into, rows);
      else addColumns(a, b, into, rows);
      return;
    case 'subtract':
      if (bNumber !== null) addNumber(-bNumber, a, into, rows);
      else for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) - (b[i] as number);
      return;
    case 'multiply':
      if (aNumber !== null) multiplyByNumber(aNumber, b, into, rows);
      else for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) * (b[i] as number);
      return;
    case 'divide':
      for (let i = 0; i < rows; i += 1) into[i] = (a[i] as number) / (b[i] as number);
      return;
    case 'power':
      raise(bNumber, a, b, into, rows);
  }
}

// Four rows a turn: the engine looks for interruptions once a turn, which costs as much as a sum or a product.

function addNumber(number: number, column: Float64Array, into: Float64Array, rows: number): void {
  let i = 0;
  for (; i + 3 < rows; i += 4) {
    into[i] = number + (column[i] as number);
    into[i + 1] = number + (column[i + 1] as number);
    into[i + 2] = number + (column[i + 2] as number);
    into[i + 3] = number + (column[i + 3] as number);
  }
  for (; i < rows; i += 1) into[i] = number + (column[i] as number);
}

function addColumns(a: Float64Array, b: Float64Array, into: Float64Array, rows: number): void {
  let i = 0;
  for (; i + 3 < rows; i += 4) {
    into[i] = (a[i] as number) + (b[i] as number);
    into[i + 1] = (a[i + 1] as number) + (b[i + 1] as number);
    into[i + 2] = (a[i + 2] as number) + (b[i + 2] as number);
    into[i + 3] = (a[i + 3] as number) + (b[i + 3] as number);
  }
  for (; i < rows; i += 1) into[i] = (a[i] as number) + (b[i] as number);
}

function multiplyByNumber(number: number, column: Float64Array, into: Float64Array, rows: number): void {
  let i = 0;
  for (; i + 3 < rows; i += 4) {
    into[i] = number * (column[i] as number);
    into[i + 1] = number * (column[i + 1] as number);
    into[i + 2] = number * (column[i + 2] as number);
    into[i + 3] = number * (column[i + 3] as number);
  }
  for (; i < rows; i += 1) into[i] = number * (column[i] as number);
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
