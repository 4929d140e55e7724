import { assessStudy } from '@/lib/services/assessment/assess-study';
import type { JobHandler } from '../job-handler';

export const handleStudyAssess: JobHandler = (ctx, { subjectId, subjectRevision }) => {
  if (subjectRevision === null) throw new TypeError(`study.assess: the revision of study ${subjectId} is not stated.`);
  return assessStudy(ctx, subjectId, subjectRevision);
};
