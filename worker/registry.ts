import type { JobName } from '@/lib/jobs/jobs';
import { handleGridRead } from './handlers/grid-read';
import { handleMailSend } from './handlers/mail-send';
import { handleStudyAssess } from './handlers/study-assess';
import { handleStudyRecheck } from './handlers/study-recheck';
import type { JobHandler } from './job-handler';

/** Every job and what does it. */
export const handlers: Record<JobName, JobHandler> = {
  'grid.read': handleGridRead,
  'study.assess': handleStudyAssess,
  'study.recheck': handleStudyRecheck,
  'mail.send': handleMailSend,
};
