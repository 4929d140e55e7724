export interface Sample { at: number; bytes: number }

const window = 6000;

/** The samples that the rate is taken from: those of the last seconds, and one before them. */
export function keepRecent(samples: readonly Sample[], next: Sample): Sample[] {
  const recent = samples.filter(({ at, bytes }) => next.at - at <= window && bytes <= next.bytes);
  return [...recent, next];
}

/** Bytes per second over the samples; null while there is too little to tell. */
export function transferRate(samples: readonly Sample[]): number | null {
  const [first, last] = [samples[0], samples.at(-1)];
  if (!first || !last || last.at - first.at < 500 || last.bytes <= first.bytes) return null;
  return ((last.bytes - first.bytes) * 1000) / (last.at - first.at);
}
