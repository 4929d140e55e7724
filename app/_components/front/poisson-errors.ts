/** −Δu = f on the unit square with u = sin(2x + 3y²) e^(xy): nothing about it suits a grid. */
const exact = (x: number, y: number) => Math.sin(2 * x + 3 * y * y) * Math.exp(x * y);

function source(x: number, y: number): number {
  const phase = 2 * x + 3 * y * y;
  const [s, c] = [Math.sin(phase), Math.cos(phase)];
  const uxx = (y * y - 4) * s + 4 * y * c;
  const uyy = (x * x - 36 * y * y) * s + (6 + 12 * x * y) * c;
  return -(uxx + uyy) * Math.exp(x * y);
}

/** The five-point operator times h², cell values against faces; a boundary value lies on the face, half a spacing away. */
function apply(cells: number, u: Float64Array, out: Float64Array): void {
  const at = (i: number, j: number) => (i < 0 || j < 0 || i >= cells || j >= cells ? null : (u[j * cells + i] ?? 0));
  for (let j = 0; j < cells; j += 1) {
    for (let i = 0; i < cells; i += 1) {
      const own = u[j * cells + i] ?? 0;
      const sides = [at(i - 1, j), at(i + 1, j), at(i, j - 1), at(i, j + 1)];
      out[j * cells + i] = sides.reduce<number>((sum, side) => sum + (side === null ? 2 * own : own - side), 0);
    }
  }
}

function rightSide(cells: number): Float64Array {
  const h = 1 / cells;
  const b = new Float64Array(cells * cells);
  for (let j = 0; j < cells; j += 1) {
    for (let i = 0; i < cells; i += 1) {
      const [x, y] = [(i + 0.5) * h, (j + 0.5) * h];
      let value = h * h * source(x, y);
      if (i === 0) value += 2 * exact(0, y);
      if (i === cells - 1) value += 2 * exact(1, y);
      if (j === 0) value += 2 * exact(x, 0);
      if (j === cells - 1) value += 2 * exact(x, 1);
      b[j * cells + i] = value;
    }
  }
  return b;
}

const dot = (a: Float64Array, b: Float64Array) => a.reduce((sum, value, index) => sum + value * (b[index] ?? 0), 0);

/** Conjugate gradients, down to round-off. */
function solve(cells: number): Float64Array {
  const residual = rightSide(cells);
  const u = new Float64Array(residual.length);
  const image = new Float64Array(residual.length);
  const step = Float64Array.from(residual);
  let size = dot(residual, residual);
  const enough = size * 1e-24;
  for (let round = 0; round < 20 * cells && size > enough; round += 1) {
    apply(cells, step, image);
    const length = size / dot(step, image);
    for (let k = 0; k < u.length; k += 1) {
      u[k] = (u[k] ?? 0) + length * (step[k] ?? 0);
      residual[k] = (residual[k] ?? 0) - length * (image[k] ?? 0);
    }
    const next = dot(residual, residual);
    for (let k = 0; k < u.length; k += 1) step[k] = (residual[k] ?? 0) + (next / size) * (step[k] ?? 0);
    size = next;
  }
  return u;
}

export interface GridErrors { cells: number; errors: Float64Array; l2: number }

/**
 * The errors of a five-point solution of a manufactured problem on a square grid, row by row from y = 0, and their L2
 * norm. Formal order 2.
 */
export function poissonErrors(cells: number): GridErrors {
  const errors = solve(cells).map((value, index) => value - exact(((index % cells) + 0.5) / cells, (Math.floor(index / cells) + 0.5) / cells));
  return { cells, errors, l2: Math.sqrt(dot(errors, errors) / errors.length) };
}
