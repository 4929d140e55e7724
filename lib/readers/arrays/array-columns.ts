import { refuseManyColumns } from '../column-limit';

/** One number of an element: '' of a plain number, `.name` of a compound's member, `[0]` of an array's. Not read where `problem` says what it is. */
export interface ElementMember { suffix: string; problem: string | null; isSingle?: boolean }

/** An array of a file that holds arrays by path. */
export interface NamedArray {
  path: string;
  dims: readonly number[];
  members: readonly ElementMember[];
}

/** A column in an array: in each row, the member of one of its elements. */
export interface ArrayColumn {
  name: string;
  /** Its place in the list of arrays. */
  array: number;
  rows: number;
  /** Elements that make one row, and which of them it is. */
  elements: number;
  element: number;
  member: number;
}

/** Vectors and points; longer last dimensions are those of structured grids, or either up to nine (tensors). */
const longestVector = 3;
const longestTensor = 9;

export const elementsOf = (dims: readonly number[]): number => dims.reduce((product, dim) => product * dim, 1);

/**
 * The columns of arrays, in their order. A one-dimensional array is a column, one value a row. Of more dimensions, one
 * whose last dimension is 2 or 3 holds a vector per row and gives the columns name[0], name[1] …; others are one column, flattened with the
 * last dimension running fastest, and from 4 to 9 also columns name[0] … Throws RejectedFile for too many of them.
 */
export function layOutColumns(arrays: readonly NamedArray[]): ArrayColumn[] {
  const columns: ArrayColumn[] = [];
  for (const [array, { path, dims, members }] of arrays.entries()) {
    const last = dims.at(-1) ?? 1;
    const all = elementsOf(dims);
    const mayBeVector = dims.length > 1 && last > 1 && last <= longestTensor;
    const add = (elements: number, element: number, place: string) => {
      for (const [member, { suffix, problem }] of members.entries()) {
        if (problem === null) columns.push({ name: `${path}${place}${suffix}`, array, rows: all / elements, elements, element, member });
      }
      refuseManyColumns(columns.length);
    };
    if (!mayBeVector || last > longestVector) add(1, 0, '');
    if (mayBeVector) for (let element = 0; element < last; element += 1) add(last, element, `[${element}]`);
  }
  return columns;
}
