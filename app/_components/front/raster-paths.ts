import type { GridErrors } from './poisson-errors';

/** Steps of colour from the paper to its opposite. */
export const levels = 33;

export interface ErrorScale { topDecade: number; decades: number }

/** Four whole decades, down from the one above the largest error. */
export function errorScale(grids: readonly GridErrors[]): ErrorScale {
  const largest = Math.max(...grids.flatMap(({ errors }) => [...errors].map(Math.abs)));
  return { topDecade: Math.ceil(Math.log10(largest)), decades: 4 };
}

/** One path for each step of colour, in units of a cell, y upwards; neighbours in a row of the same step are joined. */
export function rasterPaths({ cells, errors }: GridErrors, { topDecade, decades }: ErrorScale): { level: number; path: string }[] {
  const levelOf = (error: number) => {
    const share = error === 0 ? 0 : (Math.log10(Math.abs(error)) - topDecade + decades) / decades;
    return Math.round(Math.min(1, Math.max(0, share)) * (levels - 1));
  };
  const parts = new Map<number, string[]>();
  for (let row = 0; row < cells; row += 1) {
    const y = cells - 1 - row;
    for (let from = 0; from < cells;) {
      const level = levelOf(errors[row * cells + from] ?? 0);
      let to = from + 1;
      while (to < cells && levelOf(errors[row * cells + to] ?? 0) === level) to += 1;
      parts.set(level, [...(parts.get(level) ?? []), `M${from} ${y}h${to - from}v1h${from - to}z`]);
      from = to;
    }
  }
  return [...parts].map(([level, path]) => ({ level, path: path.join('') }));
}
