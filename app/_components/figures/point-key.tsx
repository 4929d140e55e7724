import type { SeriesNorm } from '@/lib/numerics/assessment';
import { seriesLook } from '@/lib/figures/series-point';
import { NormSymbol } from '../ui/symbols';

const fills: Partial<Record<string, string>> = { s1: 'fill-s1', s2: 'fill-s2', si: 'fill-si' };

/** Which point belongs to which norm. */
export function PointKey({ norms }: { norms: readonly SeriesNorm[] }) {
  return (
    <span className="inline-flex gap-3">
      {norms.map((norm) => {
        const { ink, path } = seriesLook(norm);
        return (
          <span key={norm} className="whitespace-nowrap">
            <svg viewBox="-6 -6 12 12" width="12" height="12" aria-hidden className="mr-1 inline-block align-[-1px]">
              <path d={path} className={fills[ink]} />
            </svg>
            <NormSymbol norm={norm} />
          </span>
        );
      })}
    </span>
  );
}
