import { sql, type Transaction } from 'kysely';
import type { Database } from '@/db/client';
import type { DB } from '@/db/schema.generated';

export type Trx = Transaction<DB>;

interface OrganisationContext { db: Database; organisation: { id: string }; requestId?: string | null; within?: Trx }

/** A part of a transaction that is undone alone where it fails. */
async function inSavepoint<T>(trx: Trx, work: (trx: Trx) => Promise<T>): Promise<T> {
  await sql`savepoint part`.execute(trx);
  try {
    const result = await work(trx);
    await sql`release savepoint part`.execute(trx);
    return result;
  } catch (error) {
    await sql`rollback to savepoint part`.execute(trx);
    throw error;
  }
}

/**
 * A transaction in which row-level security lets through the rows of one organisation; part of the transaction that the
 * context is already in, where it is.
 */
export function withOrganisation<T>(ctx: OrganisationContext, work: (trx: Trx) => Promise<T>): Promise<T> {
  if (ctx.within) return inSavepoint(ctx.within, work);
  return ctx.db.transaction().execute(async (trx) => {
    // The request goes into the outbox rows that the transaction writes.
    await sql`select set_config('app.organisation_id', ${ctx.organisation.id}, true), set_config('app.request_id', ${ctx.requestId ?? ''}, true)`.execute(trx);
    return work(trx);
  });
}

/** A transaction in which a person sees their own memberships, before an organisation is chosen. */
export function withUser<T>(ctx: { db: Database }, userId: string, work: (trx: Trx) => Promise<T>): Promise<T> {
  return ctx.db.transaction().execute(async (trx) => {
    await sql`select set_config('app.user_id', ${userId}, true)`.execute(trx);
    return work(trx);
  });
}
