import type { InvitationRow } from '@/db/queries/invitations';
import type { MailRow } from '@/db/queries/mails';
import { invitationStateSchema, type Invitation, type InvitationState } from '@/lib/domain/invitations/schema';
import { mailStateSchema } from '@/lib/domain/mail/mail-state';
import { roleSchema } from '@/lib/domain/people/roles';

/** A pending one whose time has passed has expired; nothing needs to happen for that. */
export function stateOfInvitation({ state, expires_at, until }: Pick<InvitationRow, 'state' | 'expires_at' | 'until'>, now: Date): InvitationState {
  const isOver = expires_at <= now || (until !== null && until <= now);
  return state === 'pending' && isOver ? 'expired' : invitationStateSchema.parse(state);
}

/** What an invitation offers. */
export function mapOffer(row: InvitationRow, now: Date) {
  return {
    email: row.email, roles: roleSchema.array().parse(row.roles), codes: row.code_ids === null ? null : (row.code_slugs ?? []),
    until: row.until?.toISOString() ?? null, state: stateOfInvitation(row, now), expiresAt: row.expires_at.toISOString(), invitedBy: row.invited_by_email,
  };
}

export function mapInvitation(row: InvitationRow, mail: MailRow | undefined, now: Date): Invitation {
  return {
    id: row.id, ...mapOffer(row, now), createdAt: row.created_at.toISOString(),
    mail: mail ? { id: mail.id, state: mailStateSchema.parse(mail.state), fault: mail.fault } : null,
  };
}
