import type { ErrorSeries, Norm } from '@/lib/numerics/assessment';
import { knownError } from '@/lib/numerics/norms/known-error';
import type { GridDifference, PlacedGrid } from './study-to-assess';

type DifferencesOfField = Pick<ErrorSeries, 'grids' | 'comparedTo' | 'scale'>;
interface Asked { field: string; norm: Norm; significantDigits: number | null }

/**
 * Norms of what successive solutions of a field differ by, each on the finer grid of its two, in the place of errors. What
 * is known of both solutions adds up. Null where nothing of the field was compared: gradients are not.
 */
export function differencesOf(differences: readonly GridDifference[], placed: readonly PlacedGrid[], asked: Asked): DifferencesOfField | null {
  const { field, norm } = asked;
  if (norm === 'H1' || norm === 'energy') return null;
  const find = (label: string) => placed.find(({ grid }) => grid.label === label);
  const solutionOf = (one: PlacedGrid | undefined) => one?.norms?.solutions?.find((each) => each.field === field);
  const known = (one: PlacedGrid) => knownError(
    { largest: solutionOf(one)?.maxAbs ?? 0, significantDigits: asked.significantDigits, precision: one.grid.run?.precision }, one.grid.iterativeError?.[field]?.[norm] ?? 0,
  );
  const grids = differences.flatMap(({ fine, coarse, fields }) => {
    const [found, onFine, onCoarse] = [fields.find((each) => each.field === field), find(fine), find(coarse)];
    if (!found || !onFine || !onCoarse) return [];
    return [{
      label: fine, h: onFine.h, error: found[norm], knownError: known(onFine) + known(onCoarse), exactNorm: solutionOf(onFine)?.[norm] ?? null,
      at: norm === 'Linf' ? found.at : null,
    }];
  });
  const coarsest = find(differences.at(-1)?.coarse ?? '');
  if (grids.length === 0 || !coarsest) return null;
  const largest = Math.max(...placed.map((one) => solutionOf(one)?.Linf ?? 0));
  return { grids, comparedTo: { label: coarsest.grid.label, h: coarsest.h }, scale: largest };
}
