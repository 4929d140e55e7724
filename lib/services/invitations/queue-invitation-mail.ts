import type { InvitationRow } from '@/db/queries/invitations';
import { roleSchema } from '@/lib/domain/people/roles';
import type { MemberContext } from '../context';
import { queueMail } from '../mail/queue-mail';
import type { Trx } from '../with-organisation';

/** The mail of an invitation; its link is made as it is sent, and voids the one before. */
export async function queueInvitationMail(ctx: MemberContext, trx: Trx, row: InvitationRow): Promise<void> {
  await queueMail(trx, {
    organisationId: ctx.organisation.id, userId: null, address: row.email, subjectId: row.id,
    facts: {
      kind: 'invitation', organisation: ctx.organisation.name, invitedBy: ctx.email, roles: roleSchema.array().parse(row.roles),
      codes: row.code_ids === null ? null : (row.code_slugs ?? []), until: row.until?.toISOString() ?? null,
    },
  });
}
