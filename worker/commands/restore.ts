import fs from 'node:fs';
import { isDeepStrictEqual } from 'node:util';
import { Client } from 'pg';
import { openDatabase } from '@/db/client';
import { readBackupEnv } from '@/lib/env';
import { createStorage, type Storage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { checkRecords } from '@/lib/services/records/check-records';
import { atOnce } from './backup/at-once';
import { createMeter, faultOf } from './backup/hash-file';
import { placesOf, readManifest, type BackupObject, type Manifest } from './backup/manifest';
import { listObjects, placeOf } from './backup/object-list';
import { runPostgresClient } from './backup/postgres-client';
import { runCommand } from './backup/run-command';
import { countTables } from './backup/snapshot';

const copiesAtOnce = 4;

const [folder = ''] = process.argv.slice(2);
const places = placesOf(folder);

interface Given { env: ReturnType<typeof readBackupEnv>; storage: Storage }

/** Nothing is put over what is there: a wrong address must not cost anybody their work. */
async function refuseUnlessEmpty({ env, storage }: Given): Promise<void> {
  const client = new Client({ connectionString: env.MIGRATION_DATABASE_URL });
  await client.connect();
  try {
    const { rows } = await client.query<{ name: string }>("select relname as name from pg_class where relnamespace = 'public'::regnamespace limit 1");
    if (rows[0]) throw new Error(`The database is not empty: it holds ${rows[0].name}. Restore into one that docker/postgres/roles.sql has just made.`);
  } finally {
    await client.end();
  }
  for await (const { key } of storage.listObjects('')) throw new Error(`The bucket ${env.STORAGE_BUCKET} is not empty: it holds ${key}. Restore into a new one.`);
}

/** Every file of the backup against the manifest, before anything is written anywhere. */
async function checkBackup(manifest: Manifest): Promise<void> {
  const faults: string[] = [];
  const note = (fault: string | null) => { if (fault !== null) faults.push(fault); };
  note(await faultOf('database.dump', places.database, manifest.database));
  note(await faultOf('objects.jsonl', places.list, manifest.objects));
  if (faults.length === 0) {
    await atOnce(listObjects(folder), copiesAtOnce, async (object) => note(await faultOf(`objects/${object.key}`, placeOf(folder, object.key), object)));
  }
  if (faults.length > 0) throw new Error(`The backup is damaged, and nothing was restored.\n${faults.sort().join('\n')}`);
}

async function restoreObject(storage: Storage, { key, bytes, sha256 }: BackupObject): Promise<void> {
  const { stream, facts } = createMeter();
  const file = fs.createReadStream(placeOf(folder, key));
  file.once('error', (error) => stream.destroy(error));
  await storage.put(key, file.pipe(stream), bytes);
  if (facts().sha256 !== sha256) throw new Error(`objects/${key} changed while it was restored.`);
  const stored = await storage.sizeOf(key);
  if (stored !== bytes) throw new Error(`The store kept ${stored ?? 'no'} bytes of ${key}; it has ${bytes}.`);
}

async function restoreDatabase({ env }: Given, manifest: Manifest): Promise<void> {
  await runPostgresClient('pg_restore', ['--exit-on-error', '--single-transaction', '--no-password', '--dbname', '', places.database], env.MIGRATION_DATABASE_URL);
  const tables = await countTables(env.MAINTENANCE_DATABASE_URL);
  if (isDeepStrictEqual(tables, manifest.tables)) return;
  const differing = Object.keys(manifest.tables).filter((name) => tables[name] !== manifest.tables[name]);
  throw new Error(`Restored tables have another number of rows than the backup says: ${differing.join(', ')}.`);
}

/** Whether files and records go together; faults found here were in what was backed up, and are named for whoever looks after it. */
async function tellFaults({ env, storage }: Given): Promise<void> {
  const { db } = openDatabase(env.MAINTENANCE_DATABASE_URL, (error) => console.error(`database connection: ${error.message}`));
  try {
    const check = { db, storage, organisationId: null, isHashed: false, clock: () => new Date() };
    const { files, faults } = await checkRecords(check, ({ place, id, fault }) => console.error(`As backed up: ${place} ${id} ${fault}`));
    console.log(`${files} files checked against their records, ${faults} faults.`);
  } finally {
    await db.destroy();
  }
}

await runCommand(async () => {
  if (folder === '') throw new Error('Say where from: npm run restore -- FOLDER.');
  const env = readBackupEnv(process.env);
  const given = { env, storage: createStorage(storageOptionsOf(env)) };
  const begun = performance.now();
  const manifest = readManifest(folder);
  await refuseUnlessEmpty(given);
  await checkBackup(manifest);
  await restoreDatabase(given, manifest);
  await atOnce(listObjects(folder), copiesAtOnce, (object) => restoreObject(given.storage, object));
  const { createdAt, schema, tables, objects, missing } = manifest;
  console.log(`Restored the backup of ${createdAt}: schema ${schema}, ${Object.keys(tables).length} tables, ${objects.count} files of ${objects.totalBytes} bytes.`);
  for (const key of missing) console.error(`Not in the backup, since it was not in the store: ${key}`);
  await tellFaults(given);
  console.log(`It took ${((performance.now() - begun) / 1000).toFixed(1)} s.`);
});
