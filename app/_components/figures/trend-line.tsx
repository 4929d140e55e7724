import { trendChange, trendLine } from '@/lib/figures/trend-line';
import { formatRatio } from '@/lib/domain/numbers/format-ratio';

interface TrendLineProps {
  /** Errors on equal grids, oldest release first, null where a release has none. */
  errors: readonly (number | null)[];
  /** log10 of the smallest and largest error of all rows of the table. */
  range: readonly [number, number];
  label: string;
}

/** The error over releases as a line in a table row; the factor stands beside it only where it changed. */
export function TrendLine({ errors, range, label }: TrendLineProps) {
  const { width, height, paths, dots } = trendLine(errors, range);
  const change = trendChange(errors);
  const factor = change === null ? null : `×${change >= 9.95 ? Math.round(change) : change >= 0.095 ? change.toFixed(1) : formatRatio(change)}`;
  return (
    <span className="whitespace-nowrap">
      <svg viewBox={`0 0 ${width} ${height}`} width={width} height={height} role="img" aria-label={label} className="inline-block align-[-4px]">
        {paths.map((path) => <path key={path} d={path} fill="none" strokeWidth="1.25" className="stroke-graphite" />)}
        {dots.map(({ x, y, r }) => <circle key={x} cx={x} cy={y} r={r} className="fill-ink" />)}
      </svg>
      {factor && <span className="ml-1 text-note">{factor}</span>}
    </span>
  );
}
