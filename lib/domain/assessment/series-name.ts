import type { SeriesNorm } from '@/lib/numerics/assessment';

const normNames = { L1: 'L1', L2: 'L2', Linf: 'L∞', H1: 'H1', energy: 'energy' } as const;

interface Series { field: string; norm: SeriesNorm; comparedTo?: unknown }

/**
 * What a series of errors is called inside a sentence: "the L2 error of u", or "the error of drag" for a known value, and
 * where grids are compared with each other "the L2 difference of u between successive grids".
 */
export function nameErrors({ field, norm, comparedTo }: Series): string {
  if (comparedTo !== undefined) return `the ${norm === 'value' ? '' : `${normNames[norm]} `}difference of ${field} between successive grids`;
  return norm === 'value' ? `the error of ${field}` : `the ${normNames[norm]} error of ${field}`;
}

/** The same in a list: "L2 of u", "drag". */
export function nameSeries({ field, norm }: Series): string {
  return norm === 'value' ? field : `${normNames[norm]} of ${field}`;
}

export function capitalise(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** "a", "a and b", "a, b and c". */
export function joinWords(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
