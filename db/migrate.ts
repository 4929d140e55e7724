import { promises as fs } from 'node:fs';
import path from 'node:path';
import { FileMigrationProvider, Kysely, Migrator, PostgresDialect } from 'kysely';
import { Pool } from 'pg';

const url = process.env.MIGRATION_DATABASE_URL;
if (!url) throw new Error('MIGRATION_DATABASE_URL is not set. It names the database as its owner.');

const db = new Kysely<unknown>({ dialect: new PostgresDialect({ pool: new Pool({ connectionString: url, max: 1 }) }) });
const migrator = new Migrator({
  db,
  provider: new FileMigrationProvider({ fs, path, migrationFolder: path.join(import.meta.dirname, '../migrations') }),
});

const { error, results } = await migrator.migrateToLatest();
for (const result of results ?? []) console.log(`${result.status === 'Success' ? 'applied' : 'failed'} ${result.migrationName}`);
await db.destroy();
if (error) throw error instanceof Error ? error : new Error(JSON.stringify(error));
