import type { Client } from 'pg';
import type { Logger } from '@/lib/platform/logger';

const againAfterMilliseconds = 1000;

/** Calls back on every new outbox row, opening the connection again when it breaks; the function returned ends it. */
export function listenToOutbox(open: () => Client, log: Logger, onRow: () => void): () => Promise<void> {
  let isOver = false;
  let client: Client | null = null;
  let again: NodeJS.Timeout | undefined;

  const retry = (fault: string) => {
    client = null;
    if (isOver) return;
    log.warn({ fault }, 'outbox listener');
    again = setTimeout(() => void begin(), againAfterMilliseconds);
  };

  const begin = async () => {
    const opened = open();
    client = opened;
    let isBroken = false;
    const giveUp = (fault: string) => {
      if (isBroken) return;
      isBroken = true;
      opened.end().catch(() => undefined);
      retry(fault);
    };
    opened.on('error', (error) => giveUp(error.message));
    opened.on('end', () => giveUp('the connection ended'));
    opened.on('notification', onRow);
    try {
      await opened.connect();
      await opened.query('listen outbox');
      // Rows written while nobody listened.
      onRow();
    } catch (error) {
      giveUp(error instanceof Error ? error.message : 'unknown');
    }
  };

  void begin();
  return async () => {
    isOver = true;
    clearTimeout(again);
    await client?.end().catch(() => undefined);
  };
}
