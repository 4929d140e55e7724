import { Client } from 'pg';
import { need } from './environment';

/** One connection as the application's role, to which row-level security always applies. */
export function applicationClient(): Client {
  return new Client({ connectionString: need('DATABASE_URL') });
}
