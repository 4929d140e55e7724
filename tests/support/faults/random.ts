export interface Random {
  /** From 0 up to 1. */
  next(): number;
  between(low: number, high: number): number;
  pick<T>(choices: readonly [T, ...T[]]): T;
}

/** The same numbers for the same seed, whatever runs beside (mulberry32). */
export function randomOf(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  return {
    next,
    between: (low, high) => Math.round(low + next() * (high - low)),
    pick: (choices) => choices[Math.floor(next() * choices.length)] ?? choices[0],
  };
}
