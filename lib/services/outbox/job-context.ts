import type { Mailer } from '@/lib/platform/mailer';
import type { Context } from '../context';

/** What a job works with: no person acts, and the organisation is that of its subject. */
export interface JobContext extends Pick<Context, 'db' | 'storage' | 'events' | 'clock' | 'log' | 'requestId'> {
  /** An empty id where the subject belongs to none: row-level security then shows what belongs to none. */
  organisation: { id: string };
}

/** Of a job that may send mail. */
export interface MailJobContext extends JobContext {
  mailer: Mailer;
  /** The address at which people reach the product. */
  publicUrl: string;
}
