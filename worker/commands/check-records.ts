import { parseArgs } from 'node:util';
import { openDatabase } from '@/db/client';
import { listUnsureMails } from '@/db/queries/records';
import { readEnv } from '@/lib/env';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { createStorage } from '@/lib/platform/storage';
import { checkRecords } from '@/lib/services/records/check-records';

const { values: { organisation, quick } } = parseArgs({ options: { organisation: { type: 'string' }, quick: { type: 'boolean', default: false } } });
const url = process.env.MAINTENANCE_DATABASE_URL;
if (!url) throw new Error('MAINTENANCE_DATABASE_URL is not set. It names the database as the role fourfold_maintenance.');

const { db } = openDatabase(url, (error) => console.error(`database connection: ${error.message}`));
try {
  const storage = createStorage(storageOptionsOf(readEnv(process.env)));
  const check = { db, storage, organisationId: organisation ?? null, isHashed: !quick, clock: () => new Date() };
  const { files, faults, onTheirWay } = await checkRecords(check, ({ place, id, fault }) => console.log(`${place} ${id} ${fault}`));
  for (const { id, address } of await listUnsureMails(db, organisation ?? null)) console.log(`Note: mails ${id} to ${address} may or may not have gone out.`);
  if (onTheirWay > 0) console.log(`${onTheirWay} in storage are younger than a day and not named by a row yet.`);
  console.log(`${files} files checked, ${faults} faults`);
  process.exitCode = faults === 0 ? 0 : 1;
} finally {
  await db.destroy();
}
