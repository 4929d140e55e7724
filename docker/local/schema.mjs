import fs from 'node:fs';
import path from 'node:path';
import { productEnvironment } from './environment.mjs';
import { logToFolder } from './logs.mjs';
import { root } from './places.mjs';
import { assertPortsFree, portsOf } from './ports.mjs';
import { run } from './processes.mjs';
import { migrate } from './product.mjs';
import { runFolder, startDatabase } from './services.mjs';
import { awaitEarlierProcesses, createSupervisor } from './supervisor.mjs';

const NAME = 'validate';
const committed = path.join(root, 'db/schema.generated.ts');

/** Migrates an empty database and prints its types. @returns {Promise<string>} */
async function generateSchema() {
  const folder = runFolder(NAME);
  const ports = portsOf(NAME);
  const pidFolder = path.join(folder, 'pids');
  await awaitEarlierProcesses(pidFolder);
  await assertPortsFree(NAME, { postgres: ports.postgres });
  for (const name of ['postgres', 'logs']) fs.rmSync(path.join(folder, name), { recursive: true, force: true });
  const supervisor = createSupervisor({ pidFolder, log: logToFolder(path.join(folder, 'logs')) });
  try {
    await startDatabase(NAME, supervisor, ports.postgres);
    const env = productEnvironment(ports, {});
    await migrate(env);
    const file = path.join(folder, 'schema.ts');
    const target = ['--url', env.MIGRATION_DATABASE_URL ?? '', '--out-file', file];
    await run({ command: 'npm', args: ['run', '--silent', 'generate:schema', '--', ...target], cwd: root });
    return fs.readFileSync(file, 'utf8');
  } finally {
    await supervisor.stop();
  }
}

/**
 * The database's types, as the migrations make them, against the committed file.
 * @param {boolean} writes whether to replace that file instead of complaining
 */
export async function checkSchema(writes) {
  const generated = await generateSchema();
  const present = fs.existsSync(committed) ? fs.readFileSync(committed, 'utf8') : '';
  if (generated === present) return;
  if (writes) {
    fs.writeFileSync(committed, generated);
    return;
  }
  const lines = present.split('\n');
  const first = generated.split('\n').findIndex((line, index) => line !== lines[index]);
  throw new Error(
    `db/schema.generated.ts differs from the migrated database, first at line ${first + 1}. ` +
      'Write it again with: npm run validate -- --write-schema',
  );
}
