import { findMail, updateMail, type MailRow } from '@/db/queries/mails';
import type { Mail } from '@/lib/domain/mail/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import { enqueueJob } from '../outbox/enqueue-job';
import { permit } from '../permit';
import { withOrganisation, type Trx } from '../with-organisation';
import { mapMail } from './map-mail';

/** A mail claimed for shorter may still be on its way. */
const sendingMilliseconds = 2 * 60_000;

/** Queues a mail once more, as a message of its own. */
async function queueAgain(trx: Trx, mail: MailRow): Promise<MailRow | undefined> {
  const { id, organisation_id: organisationId } = mail;
  const changes = { state: 'queued', resends: mail.resends + 1, fault: null, claimed_at: null, sent_at: null };
  const queued = await updateMail(trx, { organisationId, id, from: [mail.state] }, changes);
  if (queued) await enqueueJob(trx, { organisationId, job: 'mail.send', subjectId: id, subjectRevision: null });
  return queued;
}

/** Sends again what did not go out, or may not have; only a person decides that, since it may then come twice. */
export async function resendMail(ctx: MemberContext, key: string): Promise<Mail> {
  permit(ctx, 'people.manage');
  const { id } = keyOf(key);
  return withOrganisation(ctx, async (trx) => {
    const mail = id === null ? undefined : await findMail(trx, ctx.organisation.id, id);
    if (!mail) throw new AppError('not-found', `There is no mail “${key}”.`);
    const isStuck = mail.state === 'sending' && ctx.clock().getTime() - (mail.claimed_at?.getTime() ?? 0) > sendingMilliseconds;
    if (mail.state !== 'failed' && !isStuck) {
      throw new AppError('wrong-state', `The mail to ${mail.address} is ${mail.state}. Only one that failed, or is sending for over two minutes, is sent again.`);
    }
    const queued = await queueAgain(trx, mail);
    if (!queued) throw new AppError('wrong-state', 'The mail has changed just now. Read the list again.');
    return mapMail(queued);
  });
}
