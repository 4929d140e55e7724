import { spawn } from 'node:child_process';

/** The connection as PostgreSQL's own programs take it: not on the command line, where every user of the machine sees the password. */
function connectionOf(databaseUrl: string): Record<string, string> {
  const url = new URL(databaseUrl);
  const mode = url.searchParams.get('sslmode');
  return {
    PGHOST: decodeURIComponent(url.hostname), PGPORT: url.port === '' ? '5432' : url.port, PGUSER: decodeURIComponent(url.username),
    PGPASSWORD: decodeURIComponent(url.password), PGDATABASE: decodeURIComponent(url.pathname.slice(1)), ...(mode === null ? {} : { PGSSLMODE: mode }),
  };
}

/** Runs pg_dump or pg_restore to its end; what it says against it is in the error. */
export function runPostgresClient(program: 'pg_dump' | 'pg_restore', args: string[], databaseUrl: string): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { env: { ...process.env, ...connectionOf(databaseUrl) }, stdio: ['ignore', 'inherit', 'pipe'] });
    let said = '';
    child.stderr.on('data', (chunk: Buffer) => { said = (said + chunk.toString()).slice(-4000); });
    child.once('error', (error) => reject(new Error(`${program} cannot be started (${error.message}). It comes with Debian’s package postgresql-client.`)));
    child.once('close', (code) => {
      if (code === 0) resolve();
      else reject(new Error(`${program} ended with status ${code ?? 'none'}: ${said.trim()}`));
    });
  });
}
