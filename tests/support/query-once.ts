import { Client } from 'pg';

/** One statement on a connection of its own, as the role the URL names. */
export async function queryOnce(url: string, text: string): Promise<Record<string, unknown>[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    const { rows } = await client.query<Record<string, unknown>>(text);
    return rows;
  } finally {
    await client.end();
  }
}
