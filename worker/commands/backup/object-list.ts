import fs from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { objectSchema, placesOf, type BackupObject } from './manifest';

/** The files of a backup, as its list says. */
export async function* listObjects(folder: string): AsyncGenerator<BackupObject> {
  const { list } = placesOf(folder);
  if (!fs.existsSync(list)) return;
  for await (const line of createInterface({ input: fs.createReadStream(list) })) {
    if (line !== '') yield objectSchema.parse(JSON.parse(line));
  }
}

/** Where a file lies in the backup; a key that would lead out of it is refused. */
export function placeOf(folder: string, key: string): string {
  const { objects } = placesOf(folder);
  const place = path.resolve(objects, key);
  if (!place.startsWith(`${path.resolve(objects)}${path.sep}`)) throw new Error(`The key ${key} leads out of the backup.`);
  return place;
}

/** Removes files that the backup no longer names; how many. */
export function pruneObjects(folder: string, isNamed: (key: string) => boolean): number {
  const { objects } = placesOf(folder);
  if (!fs.existsSync(objects)) return 0;
  let removed = 0;
  for (const entry of fs.readdirSync(objects, { recursive: true, withFileTypes: true })) {
    const file = path.join(entry.parentPath, entry.name);
    if (!entry.isFile() || isNamed(path.relative(objects, file))) continue;
    fs.rmSync(file);
    removed += 1;
  }
  return removed;
}
