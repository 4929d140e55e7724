import { z } from 'zod';

const redisUrl = /^rediss?:\/\//;

const envSchema = z.object({
  FOURFOLD_MODE: z.enum(['demo', 'production']).default('demo'),
  PUBLIC_URL: z.url(),
  DATABASE_URL: z.url(),
  REDIS_URL: z.string().regex(redisUrl, 'expected redis://host:port'),
  STORAGE_ENDPOINT: z.url(),
  STORAGE_PUBLIC_URL: z.url(),
  STORAGE_BUCKET: z.string().min(1),
  STORAGE_REGION: z.string().default('us-east-1'),
  STORAGE_ACCESS_KEY: z.string().min(1),
  STORAGE_SECRET_KEY: z.string().min(1),
  STORAGE_QUOTA_BYTES: z.coerce.number().int().min(0).default(100e9),
  PART_ADDRESS_SECONDS: z.coerce.number().int().min(1).max(604_800).default(3600),
  TRUSTED_PROXIES: z.string().default(''),
  LOG_LEVEL: z.enum(['debug', 'info', 'warn', 'error']).default('info'),
});

export type Env = z.infer<typeof envSchema>;

/** Reads the environment once; a missing or wrong variable stops the start and is named. */
export function readEnv(source: Record<string, string | undefined>): Env {
  const parsed = envSchema.safeParse(source);
  if (parsed.success) return parsed.data;
  const faults = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
  throw new Error(`The environment is not complete.\n${faults.join('\n')}`);
}
