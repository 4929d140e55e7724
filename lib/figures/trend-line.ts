export interface TrendLine {
  width: number;
  height: number;
  /** One path per unbroken run of releases. */
  paths: string[];
  dots: { x: number; y: number; r: number }[];
}

const size = { width: 84, height: 18, side: 4 };
const dot = { past: 1.5, last: 2.6 };

/** The range of log10 over every row, so that all rows are drawn on one scale; null where there is no error above zero. */
export function trendRange(rows: readonly (readonly (number | null)[])[]): [number, number] | null {
  const logs = rows.flat().filter((error) => error !== null && error > 0).map((error) => Math.log10(error as number));
  if (logs.length === 0) return null;
  const [low, high] = [Math.min(...logs), Math.max(...logs)];
  return high > low ? [low, high] : [low - 0.5, high + 0.5];
}

/** The error on equal grids over releases, oldest first, as a line for a table row; a gap where a release has none. */
export function trendLine(errors: readonly (number | null)[], [low, high]: readonly [number, number]): TrendLine {
  const step = errors.length > 1 ? (size.width - 2 * size.side) / (errors.length - 1) : 0;
  const runs: { x: number; y: number }[][] = [];
  errors.forEach((error, place) => {
    if (error === null || !(error > 0)) return;
    const point = {
      x: errors.length > 1 ? size.side + place * step : size.width / 2,
      y: size.height - size.side - ((Math.log10(error) - low) / (high - low)) * (size.height - 2 * size.side),
    };
    const before = errors[place - 1];
    const run = runs.at(-1);
    if (run && before !== null && before !== undefined && before > 0) run.push(point);
    else runs.push([point]);
  });
  const points = runs.flat();
  const round = (value: number) => Number(value.toFixed(2));
  return {
    width: size.width,
    height: size.height,
    paths: runs.filter((run) => run.length > 1).map((run) => `M${run.map(({ x, y }) => `${round(x)} ${round(y)}`).join('L')}`),
    dots: points.map(({ x, y }, place) => ({ x: round(x), y: round(y), r: place === points.length - 1 ? dot.last : dot.past })),
  };
}

/** The last error over the one before it, where that is outside 0.9 to 1.1; else null, for a change too small to point at. */
export function trendChange(errors: readonly (number | null)[]): number | null {
  const [before, last] = errors.filter((error) => error !== null && error > 0).slice(-2);
  if (!before || !last) return null;
  const change = last / before;
  return change >= 0.9 && change <= 1.1 ? null : change;
}
