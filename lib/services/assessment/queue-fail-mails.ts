import { getOrganisation } from '@/db/queries/organisations';
import type { StudyHead } from '@/db/queries/studies';
import { listStudyPeople } from '@/db/queries/study-people';
import type { RevisionKey } from '@/db/queries/study-revisions';
import { decidingParts } from '@/lib/domain/assessment/deciding-parts';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { nameSeries } from '@/lib/domain/assessment/series-name';
import { stateOutcome } from '@/lib/domain/assessment/state-outcome';
import { queueMail } from '../mail/queue-mail';
import { readPreferences } from '../mail/read-preferences';
import type { JobContext } from '../outbox/job-context';
import type { Trx } from '../with-organisation';

interface FailedStudy { at: RevisionKey; head: StudyHead; caseName: string; assessment: Assessment }

/** Tells those who worked on a study that it fails, unless they chose otherwise; in the transaction that keeps the outcome. */
export async function queueFailMails(ctx: JobContext, trx: Trx, { at, head, caseName, assessment }: FailedStudy): Promise<void> {
  const { name: organisation, slug } = await getOrganisation(trx, ctx.organisation.id);
  const { sentence } = stateOutcome(assessment, head.refinement === 'time' ? 'time' : 'space');
  const failing = decidingParts(assessment).fields.filter((field) => field.outcome === 'fail').map(nameSeries);
  for (const person of await listStudyPeople(trx, at)) {
    if (!(await readPreferences(trx, person.id))['study-failed']) continue;
    await queueMail(trx, {
      organisationId: at.organisationId, userId: person.id, address: person.email, subjectId: at.studyId,
      facts: {
        kind: 'study-failed', organisation, slug, study: at.studyId, code: head.code_name, release: head.release_version, caseName,
        statement: sentence, failing,
      },
    });
  }
}
