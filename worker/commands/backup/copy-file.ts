import fs from 'node:fs';
import path from 'node:path';
import { pipeline } from 'node:stream/promises';
import type { Storage } from '@/lib/platform/storage';
import { createMeter, hashFile, type FileFacts } from './hash-file';
import type { NamedFile } from './snapshot';

export type Copied = { how: 'copied' | 'kept'; facts: FileFacts } | { how: 'missing'; fault: string };

const isAsStated = (facts: FileFacts, { bytes, sha256 }: NamedFile) => facts.bytes === bytes && (sha256 === null || facts.sha256 === sha256);

/**
 * Brings a file of the store into the backup, unless it is there already: files never change once stored, so the same
 * key with the same bytes is the same file. `known` is what an earlier backup wrote down of one whose hash no row has yet.
 */
export async function copyFile(storage: Storage, named: NamedFile, target: string, known: string | undefined): Promise<Copied> {
  const stated = { ...named, sha256: named.sha256 ?? known ?? null };
  if (stated.sha256 !== null) {
    const present = await hashFile(target);
    if (present && isAsStated(present, stated)) return { how: 'kept', facts: present };
  }
  fs.mkdirSync(path.dirname(target), { recursive: true });
  const { stream, facts } = createMeter();
  if (await storage.sizeOf(named.key) === null) return { how: 'missing', fault: `${named.key} is not in the store.` };
  await pipeline(await storage.read(named.key), stream, fs.createWriteStream(`${target}.new`, { flush: true }));
  const found = facts();
  if (!isAsStated(found, named)) {
    fs.rmSync(`${target}.new`);
    return { how: 'missing', fault: `${named.key} is damaged in the store: ${found.bytes} bytes with SHA-256 ${found.sha256}; its row says ${named.bytes} and ${named.sha256 ?? 'no hash yet'}.` };
  }
  fs.renameSync(`${target}.new`, target);
  return { how: 'copied', facts: found };
}
