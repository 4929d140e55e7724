import type { JobPayload } from '@/lib/jobs/jobs';
import type { MailJobContext } from '@/lib/services/outbox/job-context';
import type { GridReader } from '@/lib/services/reading/grid-reader';

/** Loads its subject, claims it, works; run twice, it gives the result of once. */
export type JobHandler = (ctx: MailJobContext, payload: JobPayload, tools: { reader: GridReader }) => Promise<void>;
