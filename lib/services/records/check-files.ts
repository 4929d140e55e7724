import { createHash } from 'node:crypto';
import type { Database } from '@/db/client';
import { listStoredUploads, type RecordFault } from '@/db/queries/records';
import type { Storage } from '@/lib/platform/storage';

const page = 200;
const atOnce = 8;

export interface FileCheck { db: Database; storage: Storage; organisationId: string | null; isHashed: boolean }
type StoredUpload = Awaited<ReturnType<typeof listStoredUploads>>[number];

async function hashOf(storage: Storage, key: string): Promise<string> {
  const hash = createHash('sha256');
  for await (const chunk of await storage.read(key)) hash.update(chunk as Uint8Array);
  return hash.digest('hex');
}

async function faultOf({ storage, isHashed }: FileCheck, upload: StoredUpload): Promise<string | null> {
  const bytes = await storage.sizeOf(upload.storage_key);
  if (bytes === null) return `has no file in storage under ${upload.storage_key}`;
  if (bytes !== Number(upload.bytes)) return `has ${upload.bytes} bytes; ${bytes} are in storage under ${upload.storage_key}`;
  if (!isHashed || upload.sha256 === null) return null;
  const sha256 = await hashOf(storage, upload.storage_key);
  return sha256 === upload.sha256 ? null : `has SHA-256 ${upload.sha256}; in storage under ${upload.storage_key} lie bytes with ${sha256}`;
}

/** Holds every whole file against what lies in storage: there, as long, and where asked for the same bytes. */
export async function* checkFiles(check: FileCheck, onChecked: () => void): AsyncGenerator<RecordFault> {
  let after: string | null = null;
  for (;;) {
    const uploads: StoredUpload[] = await listStoredUploads(check.db, { organisationId: check.organisationId, after, limit: page });
    for (let from = 0; from < uploads.length; from += atOnce) {
      const some = uploads.slice(from, from + atOnce);
      const faults = await Promise.all(some.map((upload) => faultOf(check, upload)));
      for (const [index, { id }] of some.entries()) {
        onChecked();
        const fault = faults[index];
        if (fault) yield { place: 'uploads', id, fault };
      }
    }
    const last = uploads.at(-1);
    if (!last || uploads.length < page) return;
    after = last.id;
  }
}
