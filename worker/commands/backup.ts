import fs from 'node:fs';
import path from 'node:path';
import { readBackupEnv } from '@/lib/env';
import { createStorage, type Storage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { atOnce } from './backup/at-once';
import { copyFile } from './backup/copy-file';
import { hashFile, type FileFacts } from './backup/hash-file';
import { placesOf, writeManifest, type Manifest } from './backup/manifest';
import { listObjects, placeOf, pruneObjects } from './backup/object-list';
import { runPostgresClient } from './backup/postgres-client';
import { runCommand } from './backup/run-command';
import { isStillNamed, openSnapshot, type Snapshot } from './backup/snapshot';

const copiesAtOnce = 4;

const [folder = ''] = process.argv.slice(2);
const places = placesOf(folder);

interface Given { env: ReturnType<typeof readBackupEnv>; storage: Storage }

async function factsOf(file: string): Promise<FileFacts> {
  const facts = await hashFile(file);
  if (!facts) throw new Error(`${file} was not written.`);
  return facts;
}

async function dumpDatabase({ env }: Given, snapshot: Snapshot): Promise<FileFacts> {
  const args = ['--format=custom', `--snapshot=${snapshot.id}`, '--no-password', `--file=${places.database}.new`];
  await runPostgresClient('pg_dump', args, env.MAINTENANCE_DATABASE_URL);
  return factsOf(`${places.database}.new`);
}

interface CopiedFiles { list: FileFacts; totalBytes: number; copied: number; missing: string[]; gone: number; named: Set<string> }

async function copyFiles({ env, storage }: Given, snapshot: Snapshot): Promise<CopiedFiles> {
  const known = new Map<string, string>();
  for await (const { key, sha256 } of listObjects(folder)) known.set(key, sha256);
  const named = new Set<string>();
  const missing: string[] = [];
  const list = fs.openSync(`${places.list}.new`, 'w');
  let [totalBytes, copied, gone] = [0, 0, 0];
  await atOnce(snapshot.files(), copiesAtOnce, async (file) => {
    const result = await copyFile(storage, file, placeOf(folder, file.key), known.get(file.key));
    if (result.how === 'missing') {
      if (await isStillNamed(env.MAINTENANCE_DATABASE_URL, file.key)) {
        console.error(result.fault);
        missing.push(file.key);
      } else gone += 1;
      return;
    }
    named.add(file.key);
    totalBytes += result.facts.bytes;
    if (result.how === 'copied') copied += 1;
    fs.writeSync(list, `${JSON.stringify({ key: file.key, ...result.facts })}\n`);
  });
  fs.fsyncSync(list);
  fs.closeSync(list);
  return { list: await factsOf(`${places.list}.new`), totalBytes, copied, missing, gone, named };
}

/** Database and files of one moment. Where a sweep has removed a file since that moment, a later one is taken. */
async function copyAll(given: Given, triesLeft: number) {
  const snapshot = await openSnapshot(given.env.MAINTENANCE_DATABASE_URL);
  const createdAt = new Date().toISOString();
  const database = await dumpDatabase(given, snapshot);
  const files = await copyFiles(given, snapshot);
  await snapshot.end();
  if (files.gone === 0) return { snapshot, createdAt, database, ...files };
  if (triesLeft === 0) throw new Error('Files are removed faster than they can be copied. Try again at a quieter time.');
  return copyAll(given, triesLeft - 1);
}

async function makeBackup(given: Given): Promise<Manifest> {
  fs.mkdirSync(places.objects, { recursive: true });
  const { snapshot, createdAt, database, list, totalBytes, copied, missing, named } = await copyAll(given, 3);
  const count = named.size;
  const manifest: Manifest = {
    format: 'fourfold-backup-1', createdAt, schema: snapshot.schema, tables: snapshot.tables, database,
    objects: { ...list, count, totalBytes }, missing: missing.sort(),
  };
  // Without a manifest a folder is no backup: an interruption between these lines leaves one that says so.
  fs.rmSync(places.manifest, { force: true });
  fs.renameSync(`${places.database}.new`, places.database);
  fs.renameSync(`${places.list}.new`, places.list);
  writeManifest(folder, manifest);
  const removed = pruneObjects(folder, (key) => named.has(key));
  console.log(`Backup of ${createdAt} in ${path.resolve(folder)}: schema ${snapshot.schema}, database ${database.bytes} bytes, ` +
    `${count} files of ${totalBytes} bytes (${copied} copied, ${count - copied} already there, ${removed} no longer named removed).`);
  return manifest;
}

await runCommand(async () => {
  if (folder === '') throw new Error('Say where to: npm run backup -- FOLDER. A folder that holds a backup is brought up to date.');
  const env = readBackupEnv(process.env);
  const begun = performance.now();
  const { missing } = await makeBackup({ env, storage: createStorage(storageOptionsOf(env)) });
  console.log(`It took ${((performance.now() - begun) / 1000).toFixed(1)} s.`);
  if (missing.length > 0) throw new Error(`${missing.length} files could not be taken; the manifest names them.`);
});
