/** Tries in a row without success after which a file counts as not sent: about two minutes. */
export const mostTries = 8;

const longest = 30_000;

/** Milliseconds to wait before the next try: 1, 2, 4, … s, at most 30 s, each drawn from half of it up, so that lanes do not try in step. */
export function waitBefore(failures: number, random: () => number): number {
  const full = Math.min(longest, 1000 * 2 ** (failures - 1));
  return full * (0.5 + 0.5 * random());
}

/** What an answer to a part says. Status 0 is no answer at all, or one that the browser may not show. */
export type PartVerdict = 'stored' | 'expired' | 'again' | 'gone';

export function judgePart({ status, isPastItsTime }: { status: number; isPastItsTime: boolean }): PartVerdict {
  if (status >= 200 && status < 300) return 'stored';
  if (status === 404) return 'gone';
  // Storage answers an address past its time with 403, or without leave for the browser to see that.
  if (status === 403 || (status === 0 && isPastItsTime)) return 'expired';
  return 'again';
}
