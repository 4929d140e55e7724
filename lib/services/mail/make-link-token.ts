import { updatePendingInvitation } from '@/db/queries/invitations';
import type { MailRow } from '@/db/queries/mails';
import { updateUnusedReset } from '@/db/queries/password-resets';
import { invitationEnd } from '@/lib/domain/invitations/days';
import { newSecretToken } from '../secret-token';
import type { Trx } from '../with-organisation';

const resetMilliseconds = 3600_000;

/**
 * The token of the link in a mail, made as it is sent, so that it stands nowhere but in the mail; the link of an earlier
 * mail is void from then on. `isNeeded` is false where what the mail is about has ended meanwhile.
 */
export async function makeLinkToken(trx: Trx, mail: MailRow, now: Date): Promise<{ isNeeded: boolean; token: string | null }> {
  const { organisation_id: organisationId, subject_id: subjectId, kind } = mail;
  const { token, sha256 } = newSecretToken();
  if (kind === 'invitation' && organisationId !== null && subjectId !== null) {
    return { isNeeded: await updatePendingInvitation(trx, organisationId, subjectId, { token_sha256: sha256, expires_at: invitationEnd(now) }), token };
  }
  if (kind === 'password-reset' && subjectId !== null) {
    const expires_at = new Date(now.getTime() + resetMilliseconds);
    return { isNeeded: await updateUnusedReset(trx, subjectId, { token_sha256: sha256, expires_at }), token };
  }
  return { isNeeded: true, token: null };
}
