import type { Kysely } from 'kysely';
import { listMailPreferences } from '@/db/queries/mail-preferences';
import type { DB } from '@/db/schema.generated';
import { usualMailPreferences, type MailPreferences } from '@/lib/domain/mail/preferences';

/** What a person chose, and what holds until they choose. */
export async function readPreferences(db: Kysely<DB>, userId: string): Promise<MailPreferences> {
  const chosen = await listMailPreferences(db, userId);
  return { ...usualMailPreferences, ...Object.fromEntries(chosen.map(({ kind, wanted }) => [kind, wanted])) };
}
