import type { SeriesNorm } from '../numerics/assessment';
import type { TextRun } from './scene';
import { seriesLook } from './series-point';

/** The symbols of some norms as runs of text: L with its index, joined by commas. */
export function normRuns(norms: readonly SeriesNorm[]): TextRun[] {
  return norms.flatMap((norm, place) => {
    const { letter, index, word } = seriesLook(norm);
    const comma: TextRun[] = place > 0 ? [{ text: ', ', face: 'sans' }] : [];
    if (word !== undefined) return [...comma, { text: word, face: 'sans' } as const];
    return [...comma, { text: letter, face: 'symbol' } as const, { text: index, face: 'index' } as const];
  });
}
