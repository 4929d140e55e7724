import type { StudyState } from '@/lib/domain/studies/schema';

/** States of a study as they open a sentence. */
export const stateWords: Record<StudyState, string> = {
  collecting: 'Collecting', assessing: 'Assessing', 'assessment-failed': 'Assessment failed', assessed: 'Assessed', 'in-review': 'In review',
  signed: 'Signed', superseded: 'Superseded', withdrawn: 'Withdrawn', abandoned: 'Abandoned',
};
