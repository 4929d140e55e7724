import fs from 'node:fs';
import path from 'node:path';
import { z } from 'zod';

const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
const fileSchema = z.strictObject({ bytes: z.number().int().min(0), sha256 });

/** One line of objects.jsonl: a file of the store, which lies in the backup under the same key. */
export const objectSchema = fileSchema.extend({ key: z.string() });
export type BackupObject = z.infer<typeof objectSchema>;

const manifestSchema = z.strictObject({
  format: z.literal('fourfold-backup-1'),
  createdAt: z.iso.datetime(),
  /** The last migration of the database. */
  schema: z.string(),
  /** Rows of every table. */
  tables: z.record(z.string(), z.number().int()),
  database: fileSchema,
  /** The list of files itself, and what it adds up to. */
  objects: fileSchema.extend({ count: z.number().int(), totalBytes: z.number().int() }),
  /** Files that the database names and the store did not give as they should be. */
  missing: z.array(z.string()),
});
export type Manifest = z.infer<typeof manifestSchema>;

export const placesOf = (folder: string) => ({
  manifest: path.join(folder, 'manifest.json'), database: path.join(folder, 'database.dump'), list: path.join(folder, 'objects.jsonl'),
  objects: path.join(folder, 'objects'),
});

export function readManifest(folder: string): Manifest {
  const file = placesOf(folder).manifest;
  if (!fs.existsSync(file)) throw new Error(`${folder} holds no backup: there is no manifest.json. A backup that was interrupted has none.`);
  const parsed = manifestSchema.safeParse(JSON.parse(fs.readFileSync(file, 'utf8')));
  if (!parsed.success) throw new Error(`${file} is damaged or of another version: ${z.prettifyError(parsed.error)}`);
  return parsed.data;
}

export function writeManifest(folder: string, manifest: Manifest): void {
  const { manifest: file } = placesOf(folder);
  fs.writeFileSync(`${file}.new`, `${JSON.stringify(manifest, null, 2)}\n`, { flush: true });
  fs.renameSync(`${file}.new`, file);
}
