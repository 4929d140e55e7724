import type { ErrorSeries } from '../assessment';

/** Machine epsilon of each precision: the spacing of numbers above 1. */
const epsilon = { double: 2 ** -52, single: 2 ** -23 } as const;
/** A solver adds many roundings of its own. */
const roundings = 100;

/**
 * Largest error that counts as round-off: 100 ε times the scale of the field, in the unit of the error. The scale is 1
 * where none is known, and where the field is zero everywhere and so sets none.
 */
export function roundOff({ precision, scale }: Pick<ErrorSeries, 'precision' | 'scale'>): number {
  return roundings * epsilon[precision] * (scale === null || scale === 0 ? 1 : scale);
}
