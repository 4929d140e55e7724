import { v4 } from 'uuid';
import type { Transfer } from './transfer';

interface Told { tab: string; transfers: Transfer[] }

/** A tab says how far it is at every step; one that is silent for so long has ended without a word. */
const silenceMilliseconds = 75_000;
const sayAgainMilliseconds = 2000;

export interface Elsewhere {
  /** What other tabs send, by grid. */
  transfers(): ReadonlyMap<string, Transfer>;
  tell(own: readonly Transfer[]): void;
}

/** Tabs of one browser tell each other what they send for a study, so that none sends what another does. */
export function openElsewhere(study: string, onChange: () => void): Elsewhere {
  const channel = new BroadcastChannel(`fourfold-uploads ${study}`);
  const tab = v4();
  const others = new Map<string, { heardAt: number; transfers: Transfer[] }>();
  let own: readonly Transfer[] = [];

  const say = (transfers: readonly Transfer[]) => channel.postMessage({ tab, transfers: [...transfers] } satisfies Told);
  channel.onmessage = ({ data }: MessageEvent<Told | 'who'>) => {
    if (data === 'who') { say(own); return; }
    if (data.transfers.length === 0) others.delete(data.tab);
    else others.set(data.tab, { heardAt: Date.now(), transfers: data.transfers });
    onChange();
  };
  setInterval(() => {
    if (own.length > 0) say(own);
    const silent = [...others].filter(([, { heardAt }]) => Date.now() - heardAt > silenceMilliseconds);
    for (const [name] of silent) others.delete(name);
    if (silent.length > 0) onChange();
  }, sayAgainMilliseconds);
  window.addEventListener('pagehide', () => say([]));
  channel.postMessage('who');

  return {
    transfers: () => new Map([...others.values()].flatMap(({ transfers }) => transfers.map((each) => [each.grid, { ...each, isElsewhere: true }]))),
    tell(transfers) {
      const isActive = ({ state }: Transfer) => state !== 'failed';
      const active = transfers.filter(isActive);
      if (active.length === 0 && own.length === 0) return;
      own = active;
      say(active);
    },
  };
}
