import { setMailPreference } from '@/db/queries/mail-preferences';
import type { MailPreferences } from '@/lib/domain/mail/preferences';
import type { UserContext } from '../context';
import { readPreferences } from '../mail/read-preferences';
import { requireSession } from '../require-session';

export async function updateMailPreferences(ctx: UserContext, input: Partial<MailPreferences>): Promise<MailPreferences> {
  requireSession(ctx);
  for (const [kind, wanted] of Object.entries(input)) {
    await setMailPreference(ctx.db, { user_id: ctx.userId, kind, wanted });
  }
  return readPreferences(ctx.db, ctx.userId);
}
