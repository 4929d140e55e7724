import type { Region } from '../assessment';

export type Interval = readonly [number, number];
export type BandName = '2h' | 'fixed';

/** What tells that a row lies in a band along the boundary. */
export type BandTest =
  /** It is no farther from the boundary than this. */
  | { by: 'thickness'; thickness: number }
  /** It is no farther than twice its own size, its weight to the power 1/dimension. */
  | { by: 'weight'; dimension: number }
  /** Its flag is not zero. */
  | { by: 'flag' };

/** The bands that norms are asked for of, each with what lies inside of it: plain data, which a thread can hand to another. */
export interface Bands {
  /** Where distances come from: a column, or the box whose sides are the boundary, an interval for each coordinate. Null where no band needs any. */
  distance: 'column' | readonly Interval[] | null;
  bands: readonly { name: BandName; test: BandTest }[];
}

/** The two parts that a band makes of the domain. */
export function regionsOfBand(name: BandName): { interior: Region; boundary: Region } {
  return { interior: `interior-${name}`, boundary: `boundary-${name}` };
}
