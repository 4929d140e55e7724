import type { Context } from '../context';

/** What a job works with: no person acts, and the organisation is that of its subject. */
export interface JobContext extends Pick<Context, 'db' | 'storage' | 'events' | 'clock' | 'log' | 'requestId'> {
  organisation: { id: string };
}
