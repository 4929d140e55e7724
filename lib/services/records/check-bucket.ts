import type { Database } from '@/db/client';
import { listNamings, type RecordFault } from '@/db/queries/records';
import type { Storage, StoredObject } from '@/lib/platform/storage';

const batch = 500;

type Found = StoredObject & { multipartId?: string };
export interface Unnamed extends RecordFault { since: Date }

async function* batches(found: AsyncIterable<Found>): AsyncGenerator<Found[]> {
  let some: Found[] = [];
  for await (const each of found) {
    some.push(each);
    if (some.length < batch) continue;
    yield some;
    some = [];
  }
  if (some.length > 0) yield some;
}

async function* unnamed(db: Database, found: AsyncIterable<Found>): AsyncGenerator<Unnamed> {
  for await (const some of batches(found)) {
    const namings = await listNamings(db, some.map(({ key }) => key));
    for (const { key, multipartId, since } of some) {
      const isNamed = namings.some((row) => row.storage_key === key && (multipartId === undefined || row.multipart_id === multipartId));
      if (isNamed) continue;
      yield { place: 'bucket', id: key, fault: multipartId === undefined ? 'no row names this object' : `no row names the upload in parts ${multipartId}`, since };
    }
  }
}

/** What lies in the bucket, under one organisation or at all, and no row explains. */
export async function* checkBucket({ db, storage, organisationId }: { db: Database; storage: Storage; organisationId: string | null }): AsyncGenerator<Unnamed> {
  const prefix = organisationId === null ? '' : `${organisationId}/`;
  yield* unnamed(db, storage.listObjects(prefix));
  yield* unnamed(db, storage.listMultiparts(prefix));
}
