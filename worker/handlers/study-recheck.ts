import { recheckStudy } from '@/lib/services/rechecks/recheck-study';
import type { JobHandler } from '../job-handler';

export const handleStudyRecheck: JobHandler = (ctx, { subjectId }, { reader }) => recheckStudy(ctx, subjectId, reader);
