import { Kysely, PostgresDialect } from 'kysely';
import { Pool } from 'pg';
import type { DB } from './schema.generated';

export type Database = Kysely<DB>;

/** How long a connection and a statement may take; a page is not kept waiting for a database that hangs. */
export interface DatabasePatience { connectionTimeoutMillis?: number; statement_timeout?: number; query_timeout?: number }

/** A pool and its query builder; the URL is handed in, so that nothing here reads the environment. */
export function openDatabase(url: string, onError: (error: Error) => void, patience: DatabasePatience = {}): { pool: Pool; db: Database } {
  const pool = new Pool({ connectionString: url, max: 10, connectionTimeoutMillis: 5000, keepAlive: true, ...patience });
  // An idle connection that breaks would otherwise end the process.
  pool.on('error', onError);
  return { pool, db: new Kysely<DB>({ dialect: new PostgresDialect({ pool }) }) };
}
