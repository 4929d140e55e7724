import type { ErrorSeries, FieldGrid } from '../assessment';
import { relativeSize } from '../uncertainty/relative-size';
import { roundOff } from './round-off';

/** An error of less than twenty known errors says more about the floor than about the scheme. */
const knownErrors = 20;

/**
 * Marks the trailing (finest) grids whose error is round-off, or no more than 20 known errors, as not used.
 *
 * Never for a plateau: an error that stops falling without a known reason is evidence. Grids run finest first; a grid
 * behind the first usable one stays, however small its error.
 */
export function dropFloor(series: ErrorSeries): FieldGrid[] {
  const floor = roundOff(series);
  let trailing = true;
  return series.grids.map(({ label, h, error, knownError, exactNorm, at }) => {
    const unusedReason = error <= floor ? 'round-off' : error <= knownErrors * knownError ? 'known-error' : undefined;
    trailing &&= unusedReason !== undefined;
    return {
      label, h, error, knownError, relativeError: exactNorm === null ? null : relativeSize(error, exactNorm), used: !trailing,
      ...(trailing && { unusedReason }), ...(at && { at }),
    };
  });
}
