/** A column this much smaller after what it shares with earlier ones is taken away says nothing of its own. */
const dependent = 1e-12;

/**
 * The x that makes Σ w_i (Σ_j rows[i][j]·x_j − right[i])² least, by Gram–Schmidt with one repetition (G. H. Golub and
 * C. F. Van Loan, Matrix Computations, 5.2). Columns of any size; weights 1 where left out.
 *
 * Returns null where a column is, to rounding, a combination of the earlier ones, or there are more columns than rows.
 */
export function solveLeastSquares(rows: readonly (readonly number[])[], right: readonly number[], weights?: readonly number[]): number[] | null {
  const count = rows[0]?.length ?? 0;
  if (count === 0 || rows.length < count) return null;
  const root = rows.map((_, i) => Math.sqrt(weights?.[i] ?? 1));
  const columns = Array.from({ length: count }, (_, j) => rows.map((row, i) => (row[j] ?? 0) * (root[i] ?? 1)));
  const target = right.map((value, i) => value * (root[i] ?? 1));
  const basis: number[][] = [];
  const upper: number[][] = [];
  for (const column of columns) {
    const size = norm(column);
    const coefficients = basis.map(() => 0);
    for (let pass = 0; pass < 2; pass += 1) {
      basis.forEach((direction, k) => {
        coefficients[k] = (coefficients[k] ?? 0) + removePart(column, direction);
      });
    }
    const rest = norm(column);
    if (!(rest > dependent * size)) return null;
    basis.push(column.map((value) => value / rest));
    upper.push([...coefficients, rest]);
  }
  const projections = basis.map((direction) => removePart(target, direction));
  return substituteBack(upper, projections);
}

function substituteBack(upper: readonly number[][], projections: readonly number[]): number[] {
  const solution = [...projections];
  for (let j = solution.length - 1; j >= 0; j -= 1) {
    solution[j] = (solution[j] ?? 0) / (upper[j]?.[j] ?? 1);
    for (let k = 0; k < j; k += 1) solution[k] = (solution[k] ?? 0) - (upper[j]?.[k] ?? 0) * (solution[j] ?? 0);
  }
  return solution;
}

/** Takes the part along a direction of length 1 out of a vector and tells how long it was. */
function removePart(vector: number[], direction: readonly number[]): number {
  const part = vector.reduce((sum, value, i) => sum + value * (direction[i] ?? 0), 0);
  vector.forEach((value, i) => {
    vector[i] = value - part * (direction[i] ?? 0);
  });
  return part;
}

function norm(vector: readonly number[]): number {
  return Math.sqrt(vector.reduce((sum, value) => sum + value * value, 0));
}
