import { countOpenMails } from '@/db/queries/mails';
import { countOpenOutboxRows } from '@/db/queries/outbox';
import { countReceivingUploads } from '@/db/queries/uploads';
import { jobNameSchema } from '@/lib/jobs/jobs';
import type { Context } from '../context';

interface JobMeasure { job: string; state: string; count: number; oldestSeconds: number }

export interface ServiceMeasures {
  queue: Record<string, number>;
  jobs: JobMeasure[];
  openUploads: number;
  /** By state; a mail that is out is no longer counted. */
  mails: Record<string, number>;
}

const mailStates = ['queued', 'sending', 'failed', 'cancelled'];
const openStates = ['waiting', 'queued', 'failed'];

/** What waits in the whole installation, whichever process is asked; what waits nowhere is told as none. */
export async function measureService({ db, clock }: Context, countQueue: () => Promise<Record<string, number>>): Promise<ServiceMeasures> {
  const [queue, open, openUploads, openMails] = await Promise.all([countQueue(), countOpenOutboxRows(db), countReceivingUploads(db), countOpenMails(db)]);
  const now = clock().getTime();
  const jobs = jobNameSchema.options.flatMap((job) => {
    const rows = open.filter((row) => row.job === job);
    const oldestSeconds = Math.max(0, ...rows.map((row) => (now - row.oldest.getTime()) / 1000));
    return openStates.map((state) => ({ job, state, count: Number(rows.find((row) => row.state === state)?.count ?? 0), oldestSeconds }));
  });
  const mails = Object.fromEntries(mailStates.map((state) => [state, Number(openMails.find((row) => row.state === state)?.count ?? 0)]));
  return { queue, jobs, openUploads, mails };
}
