import { levels } from './raster-paths';

const lastStop = 8;

/** The colour of a step, between two of the nine stops of the scale. */
export function mapColour(level: number): string {
  const place = (level / (levels - 1)) * lastStop;
  const stop = Math.min(lastStop - 1, Math.floor(place));
  const share = Math.round((place - stop) * 100);
  return `color-mix(in oklab, var(--map-${stop + 1}) ${share}%, var(--map-${stop}))`;
}
