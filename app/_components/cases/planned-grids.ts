import { typedNumber } from '../forms/typed-number';
import type { GridValues, SpacingAs } from './case-values';

interface Series { coarsest: string; ratio: string; count: string; spacingAs: SpacingAs; dimension: number }

/** A series of grids from the coarsest one, refined by one ratio; null while the series cannot be told. */
export function plannedGrids({ coarsest, ratio, count, spacingAs, dimension }: Series): GridValues[] | null {
  const [start, factor, grids] = [typedNumber(coarsest), typedNumber(ratio), typedNumber(count)];
  if (typeof start !== 'number' || typeof factor !== 'number' || typeof grids !== 'number') return null;
  if (!(start > 0) || !(factor > 1) || !Number.isInteger(grids) || grids < 2 || grids > 20) return null;
  return Array.from({ length: grids }, (_, index) => {
    const fineness = factor ** index;
    const spacing = spacingAs === 'h' ? start / fineness : Math.round(start * (spacingAs === 'cells' ? fineness ** dimension : fineness));
    const shown = spacingAs === 'h' ? String(Number(spacing.toPrecision(12))) : String(spacing);
    return { label: spacingAs === 'h' ? `g${index + 1}` : `n${shown}`, spacing: shown, dt: '', kept: null };
  });
}
