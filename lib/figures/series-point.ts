import type { SeriesNorm } from '../numerics/assessment';
import type { Ink, ScenePath } from './scene';

/** A word stands where the norm has no letter. */
interface SeriesLook { ink: Ink; path: string; letter: string; index: string; word?: string }

const circle = 'M4 0A4 4 0 1 1-4 0A4 4 0 1 1 4 0z';
export const diamond = 'M0-5.2L5.2 0 0 5.2-5.2 0z';
const cross = 'M-1.6-4.9H1.6V-1.6H4.9V1.6H1.6V4.9H-1.6V1.6H-4.9V-1.6H-1.6z';

/** Points are never squares or right triangles: those are outcomes. */
const looks: Record<SeriesNorm, SeriesLook> = {
  L1: { ink: 's1', path: circle, letter: 'L', index: '1' },
  L2: { ink: 's2', path: diamond, letter: 'L', index: '2' },
  Linf: { ink: 'si', path: cross, letter: 'L', index: '∞' },
  H1: { ink: 'graphite', path: 'M-5-3.6H5L0 5z', letter: 'H', index: '1' },
  energy: { ink: 'graphite', path: 'M-4.6 0L-2.3-4H2.3L4.6 0 2.3 4H-2.3z', letter: '', index: '', word: 'energy' },
  value: { ink: 's2', path: diamond, letter: '', index: '', word: 'value' },
};

export const seriesLook = (norm: SeriesNorm): SeriesLook => looks[norm];

/** A point of the series, with a halo of paper; hollow where the grid is left out. */
export function seriesPoint(norm: SeriesNorm, x: number, y: number, isHollow: boolean): ScenePath[] {
  const { ink, path } = looks[norm];
  const halo: ScenePath = { kind: 'path', path, at: [x, y], stroke: 'paper', width: isHollow ? 4 : 2.5 };
  const point: ScenePath = isHollow
    ? { kind: 'path', path, at: [x, y], fill: 'paper', stroke: ink, width: 1.5 }
    : { kind: 'path', path, at: [x, y], fill: ink };
  return [halo, point];
}
