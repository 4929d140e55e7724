import { formalLine } from './formal-line';
import type { FigureField } from './figure-fields';

export interface SlopeTriangle {
  /** log10 of the spacing at both ends of the base, one halving apart. */
  from: number;
  to: number;
  /** log10 of the error along the base. */
  base: number;
  /** One slope per formal order, flattest first, with the height it reaches. */
  slopes: { order: number; top: number }[];
}

const decadesBelow = 0.42;

/** The triangle that shows the formal orders of a field, below the lowest formal line between the third and second coarsest grid. */
export function slopeTriangle({ norms, grids }: FigureField): SlopeTriangle | null {
  const lines = norms.map(formalLine).filter((line) => line !== null);
  const orders = [...new Set(lines.map(({ order }) => order))].filter((order) => order > 0).sort((a, b) => a - b);
  const start = grids.at(-3) ?? grids[0];
  const coarsest = grids.at(-1);
  if (orders.length === 0 || !start || !coarsest) return null;
  const halving = Math.log10(2);
  const from = Math.min(Math.log10(start.h), Math.max(Math.log10(grids[0]?.h ?? start.h), Math.log10(coarsest.h) - halving));
  const base = Math.min(...lines.map((line) => line.at(from))) - decadesBelow;
  return { from, to: from + halving, base, slopes: orders.map((order) => ({ order, top: base + order * halving })) };
}
