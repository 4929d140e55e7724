import { Pool } from 'pg';
import { need } from './environment';

let pool: Pool | undefined;

/** The database as its superuser, past row-level security: only to prepare what no call of the API can, and to look. */
export function adminDatabase(): Pool {
  if (!pool) {
    pool = new Pool({ connectionString: need('TEST_ADMIN_DATABASE_URL'), max: 2, allowExitOnIdle: true });
    // A server that a test kills takes idle connections with it; the next query opens another.
    pool.on('error', () => undefined);
  }
  return pool;
}
