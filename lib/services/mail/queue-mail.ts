import { insertMail } from '@/db/queries/mails';
import { json } from '@/db/json';
import type { LetterFacts } from '@/lib/domain/mail/letter-facts';
import { newId } from '../keys';
import { enqueueJob } from '../outbox/enqueue-job';
import type { Trx } from '../with-organisation';

interface MailToQueue {
  /** Null for mails about an account. */
  organisationId: string | null;
  userId: string | null;
  address: string;
  subjectId: string | null;
  facts: LetterFacts;
}

/** Writes a mail in the transaction of what it tells; the worker sends it. */
export async function queueMail(trx: Trx, { organisationId, userId, address, subjectId, facts }: MailToQueue): Promise<void> {
  const id = newId();
  await insertMail(trx, { id, organisation_id: organisationId, user_id: userId, address, kind: facts.kind, subject_id: subjectId, facts: json(facts) });
  await enqueueJob(trx, { organisationId, job: 'mail.send', subjectId: id, subjectRevision: null });
}
