import { assessStudy } from '@/lib/services/assessment/assess-study';
import type { JobHandler } from '../job-handler';

export const handleStudyAssess: JobHandler = (ctx, { subjectId, subjectRevision }, { reader }) => {
  if (subjectRevision === null) throw new TypeError(`study.assess: the revision of study ${subjectId} is not stated.`);
  return assessStudy(ctx, { studyId: subjectId, revision: subjectRevision }, reader);
};
