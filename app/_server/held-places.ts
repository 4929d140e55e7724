import 'server-only';
import { AppError } from '@/lib/errors';
import type { UserContext } from '@/lib/services/context';

/** What keeps a connection open, and how often one caller may at a web process at once. */
const places = {
  events: { most: 40, what: 'event streams', mend: 'Close pages of studies, or end streams that nobody reads.' },
  wait: { most: 20, what: 'calls that wait for an outcome', mend: 'Let some of them end first, or ask without ?wait=.' },
} as const;
const comeBackSeconds = 5;

const held = new Map<string, number>();

/** Takes a place for the caller, a token or a person, until the function it gives is called; 429 where all are taken. */
export function holdPlace(kind: keyof typeof places, { userId, token }: UserContext): () => void {
  const { most, what, mend } = places[kind];
  const key = `${kind} ${token?.id ?? userId}`;
  const count = held.get(key) ?? 0;
  if (count >= most) {
    throw new AppError('too-many-requests', `${count} ${what} are open, and at most ${most} may be at once. ${mend}`, { retryAfter: comeBackSeconds });
  }
  held.set(key, count + 1);
  let isHeld = true;
  return () => {
    if (!isHeld) return;
    isHeld = false;
    const left = (held.get(key) ?? 1) - 1;
    if (left > 0) held.set(key, left);
    else held.delete(key);
  };
}
