export type Random = () => number;

/** Numbers from 0 to 1, the same for the same seed (G. Marsaglia, Xorshift RNGs, 2003). */
export function seeded(seed: number): Random {
  let state = seed | 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
}

/** A whole number from 0 to `most`. */
export const upTo = (random: Random, most: number): number => Math.floor(random() * (most + 1));
export const oneOf = <T>(random: Random, values: readonly T[]): T => values[upTo(random, values.length - 1)] as T;
