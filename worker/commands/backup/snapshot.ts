import { Client } from 'pg';

const batch = 1000;

export interface NamedFile { key: string; bytes: number; sha256: string | null }

export interface Snapshot {
  id: string;
  schema: string;
  tables: Record<string, number>;
  /** Every whole file that a row names, by key. */
  files(): AsyncGenerator<NamedFile>;
  end(): Promise<void>;
}

async function countRows(client: Client): Promise<Record<string, number>> {
  const { rows } = await client.query<{ name: string }>(
    "select relname as name from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' order by relname",
  );
  const tables: Record<string, number> = {};
  for (const { name } of rows) {
    const counted = await client.query<{ count: string }>(`select count(*) from public."${name}"`);
    tables[name] = Number(counted.rows[0]?.count);
  }
  return tables;
}

async function lastMigration(client: Client): Promise<string> {
  const { rows } = await client.query<{ name: string }>('select name from kysely_migration order by name desc limit 1');
  if (!rows[0]) throw new Error('The database holds no migration.');
  return rows[0].name;
}

/** Holds the database as it is now, so that the dump and the list of files tell of the same moment. */
export async function openSnapshot(databaseUrl: string): Promise<Snapshot> {
  const client = new Client({ connectionString: databaseUrl });
  await client.connect();
  await client.query('begin isolation level repeatable read read only');
  const { rows } = await client.query<{ id: string }>('select pg_export_snapshot() as id');
  return {
    id: rows[0]?.id ?? '',
    schema: await lastMigration(client),
    tables: await countRows(client),
    async *files() {
      let after = '';
      for (;;) {
        const page = await client.query<{ key: string; bytes: string; sha256: string | null }>(
          "select storage_key as key, bytes, sha256 from uploads where state = 'stored' and storage_key > $1 order by storage_key limit $2", [after, batch],
        );
        for (const { key, bytes, sha256 } of page.rows) yield { key, bytes: Number(bytes), sha256 };
        if (page.rows.length < batch) return;
        after = page.rows.at(-1)?.key ?? '';
      }
    },
    async end() {
      await client.query('rollback');
      await client.end();
    },
  };
}

/** Rows of every table as they are now. */
export async function countTables(databaseUrl: string): Promise<Record<string, number>> {
  const client = new Client({ connectionString: databaseUrl });
  await client.connect();
  try {
    return await countRows(client);
  } finally {
    await client.end();
  }
}

/** Whether the database still names the file, or has let it go since the snapshot. */
export async function isStillNamed(databaseUrl: string, key: string): Promise<boolean> {
  const client = new Client({ connectionString: databaseUrl });
  await client.connect();
  try {
    const { rowCount } = await client.query("select 1 from uploads where storage_key = $1 and state = 'stored'", [key]);
    return rowCount !== 0;
  } finally {
    await client.end();
  }
}
