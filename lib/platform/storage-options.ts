import type { Env } from '@/lib/env';

type StorageEnv = Pick<Env, 'STORAGE_ENDPOINT' | 'STORAGE_PUBLIC_URL' | 'STORAGE_BUCKET' | 'STORAGE_REGION' | 'STORAGE_ACCESS_KEY' | 'STORAGE_SECRET_KEY' | 'PART_ADDRESS_SECONDS'>;

/** Where files lie, and how long an address for a part holds. */
export function storageOptionsOf(env: StorageEnv) {
  return {
    endpoint: env.STORAGE_ENDPOINT, publicUrl: env.STORAGE_PUBLIC_URL, bucket: env.STORAGE_BUCKET, region: env.STORAGE_REGION,
    accessKeyId: env.STORAGE_ACCESS_KEY, secretAccessKey: env.STORAGE_SECRET_KEY,
    partLifetimeSeconds: env.PART_ADDRESS_SECONDS,
  };
}
