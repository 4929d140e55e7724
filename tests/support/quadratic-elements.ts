/** Three Gauss points on [0, 1] with their weights: exact to degree 5. */
const gauss = [[0.5 - Math.sqrt(0.15), 5 / 18], [0.5, 8 / 18], [0.5 + Math.sqrt(0.15), 5 / 18]] as const;
/** Two of them: where slopes of elements of degree 2 superconverge. */
export const twoPoints = [[0.5 - Math.sqrt(1 / 12), 0.5], [0.5 + Math.sqrt(1 / 12), 0.5]] as const;
export const threePoints = gauss;
const shapes = (s: number) => [(1 - s) * (1 - 2 * s), 4 * s * (1 - s), s * (2 * s - 1)];
const slopes = (s: number) => [4 * s - 3, 4 - 8 * s, 4 * s - 1];

export interface Element { x: number; w: number; u: number; slope: number }

/**
 * Solves −u″ = π² sin πx on [0, 1] with u = 0 at both ends by elements of degree 2 with three Gauss points, and gives the
 * rows of quadrature points and those of all nodes. u = sin πx.
 */
export function solveQuadraticElements(elements: number, rule: readonly (readonly [number, number])[] = gauss): { points: Element[]; nodes: { x: number; u: number }[] } {
  const h = 1 / elements;
  const size = 2 * elements + 1;
  const matrix = Array.from({ length: size }, () => new Float64Array(size));
  const right = new Float64Array(size);
  const add = (row: number, column: number, value: number) => { (matrix[row] as Float64Array)[column] = ((matrix[row] as Float64Array)[column] ?? 0) + value; };
  for (let element = 0; element < elements; element += 1) {
    for (const [s, weight] of gauss) {
      const [shape, slope] = [shapes(s), slopes(s)];
      for (let i = 0; i < 3; i += 1) {
        right[2 * element + i] = (right[2 * element + i] ?? 0) + weight * h * (shape[i] ?? 0) * Math.PI ** 2 * Math.sin(Math.PI * (element + s) * h);
        for (let j = 0; j < 3; j += 1) add(2 * element + i, 2 * element + j, (weight * (slope[i] ?? 0) * (slope[j] ?? 0)) / h);
      }
    }
  }
  for (const end of [0, size - 1]) {
    matrix[end] = new Float64Array(size);
    add(end, end, 1);
    right[end] = 0;
  }
  const u = eliminate(matrix, right);
  const points = Array.from({ length: elements }, (_, element) => rule.map(([s, weight]): Element => {
    const sum = (factors: number[]) => factors.reduce((total, factor, i) => total + factor * (u[2 * element + i] ?? 0), 0);
    return { x: (element + s) * h, w: weight * h, u: sum(shapes(s)), slope: sum(slopes(s)) / h };
  })).flat();
  return { points, nodes: [...u].map((value, i) => ({ x: (i * h) / 2, u: value })) };
}

/** Gauss elimination within the band of two, which needs no row exchanges here. */
function eliminate(matrix: Float64Array[], right: Float64Array): Float64Array {
  const at = (row: number, column: number) => matrix[row]?.[column] ?? 0;
  const size = right.length;
  for (let pivot = 0; pivot < size; pivot += 1) {
    for (let row = pivot + 1; row < Math.min(size, pivot + 3); row += 1) {
      const factor = at(row, pivot) / at(pivot, pivot);
      for (let column = pivot; column < Math.min(size, pivot + 3); column += 1) (matrix[row] as Float64Array)[column] = at(row, column) - factor * at(pivot, column);
      right[row] = (right[row] ?? 0) - factor * (right[pivot] ?? 0);
    }
  }
  for (let row = size - 1; row >= 0; row -= 1) {
    let value = right[row] ?? 0;
    for (let column = row + 1; column < Math.min(size, row + 3); column += 1) value -= at(row, column) * (right[column] ?? 0);
    right[row] = value / at(row, row);
  }
  return right;
}
