/** Ends of the scale as log10 of the error. */
export interface MapScale { from: number; to: number }

const decades = 4;
/** log10 of a power of ten may come out a little above it. */
const slack = 1e-9;

/** Four whole decades, down from the one above the largest error. Null where no error is above zero. */
export function mapScale(largest: number): MapScale | null {
  if (!(largest > 0)) return null;
  const to = Math.ceil(Math.log10(largest) - slack);
  return { from: to - decades, to };
}

/** Where an error lies on the scale, from 0 to 1; what is below it lies at its end. */
export function placeOnScale(error: number, { from, to }: MapScale): number {
  return error > 0 ? Math.min(1, Math.max(0, (Math.log10(error) - from) / (to - from))) : 0;
}
