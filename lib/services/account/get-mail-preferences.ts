import type { MailPreferences } from '@/lib/domain/mail/preferences';
import type { UserContext } from '../context';
import { readPreferences } from '../mail/read-preferences';
import { requireSession } from '../require-session';

export async function getMailPreferences(ctx: UserContext): Promise<MailPreferences> {
  requireSession(ctx);
  return readPreferences(ctx.db, ctx.userId);
}
