const shortestMilliseconds = 500;
const longestMilliseconds = 30_000;
/** A stream that is back sooner, as when a server process gives way to another, is not told of. */
const quietMilliseconds = 3000;

interface Follower {
  listen: (source: EventSource) => void;
  onInterrupted: (isInterrupted: boolean) => void;
  /** The server answered, and did not open the stream. */
  onRefused: () => void;
  onBack: () => void;
}

/** Listens to server-sent events and opens them again when they end, each time later than before; returns what stops it. */
export function followStream(address: string, { listen, onInterrupted, onRefused, onBack }: Follower): () => void {
  let source: EventSource | null = null;
  let again: ReturnType<typeof setTimeout> | undefined;
  let telling: ReturnType<typeof setTimeout> | undefined;
  let failures = 0;

  const open = () => {
    clearTimeout(again);
    source?.close();
    const opened = new EventSource(address);
    source = opened;
    listen(opened);
    opened.onopen = () => {
      clearTimeout(telling);
      telling = undefined;
      if (failures > 0) onBack();
      failures = 0;
      onInterrupted(false);
    };
    opened.onerror = () => {
      const isRefused = opened.readyState === EventSource.CLOSED;
      opened.close();
      failures += 1;
      telling ??= setTimeout(() => onInterrupted(true), quietMilliseconds);
      if (isRefused) onRefused();
      const full = Math.min(longestMilliseconds, shortestMilliseconds * 2 ** (failures - 1));
      again = setTimeout(open, full * (0.5 + 0.5 * Math.random()));
    };
  };
  const openNow = () => { if (failures > 0) open(); };

  open();
  window.addEventListener('online', openNow);
  return () => {
    window.removeEventListener('online', openNow);
    clearTimeout(again);
    clearTimeout(telling);
    source?.close();
  };
}
