import { deleteSessions } from '@/db/queries/sessions';
import { voidResets } from '@/db/queries/password-resets';
import { updatePassword } from '@/db/queries/users';
import { queueMail } from '../mail/queue-mail';
import type { Trx } from '../with-organisation';

interface PasswordChange { user: { id: string; email: string }; passwordHash: string; now: Date; keptSessionId: string | null }

/** A new password ends the other sessions, voids links to set one, and is told by mail. */
export async function setPassword(trx: Trx, { user, passwordHash, now, keptSessionId }: PasswordChange): Promise<void> {
  await updatePassword(trx, user.id, passwordHash);
  await voidResets(trx, user.id, now);
  await deleteSessions(trx, user.id, keptSessionId);
  await queueMail(trx, {
    organisationId: null, userId: user.id, address: user.email, subjectId: null, facts: { kind: 'password-changed', at: now.toISOString() },
  });
}
