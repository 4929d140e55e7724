import type { Env } from '@/lib/env';

/** Where files lie, and how long an address for a part holds. */
export function storageOptionsOf(env: Env) {
  return {
    endpoint: env.STORAGE_ENDPOINT, publicUrl: env.STORAGE_PUBLIC_URL, bucket: env.STORAGE_BUCKET, region: env.STORAGE_REGION,
    accessKeyId: env.STORAGE_ACCESS_KEY, secretAccessKey: env.STORAGE_SECRET_KEY,
    partLifetimeSeconds: env.PART_ADDRESS_SECONDS,
  };
}
