import { ensureBucket } from '../local/bucket.mjs';

const needed = ['STORAGE_ENDPOINT', 'STORAGE_REGION', 'STORAGE_BUCKET', 'STORAGE_ACCESS_KEY', 'STORAGE_SECRET_KEY'];
/** @type {Record<string, string>} */
const env = {};
for (const name of needed) {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set.`);
  env[name] = value;
}
await ensureBucket(env);
