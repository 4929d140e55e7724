import { z } from 'zod';

const redisUrl = /^rediss?:\/\//;

const seconds = (smallest: number) => z.coerce.number<string>().int().min(smallest);
const port = z.coerce.number<string>().int().min(1).max(65535);

/** The descriptions are what the production page of the docs prints. */
const envSchema = z.object({
  FOURFOLD_MODE: z.enum(['demo', 'production']).default('demo').describe('In demo mode the demo may be filled in, whose passwords are known.'),
  PUBLIC_URL: z.url().describe('Where people reach the product. With https, session cookies are sent over TLS only.'),
  DATABASE_URL: z.url().describe('PostgreSQL as the role fourfold_app.'),
  REDIS_URL: z.string().regex(redisUrl, 'expected redis://host:port').describe('Redis for the queue, live updates and rate limits. It must write to disk and evict nothing.'),
  STORAGE_ENDPOINT: z.url().describe('The S3-compatible store, as web and worker reach it.'),
  STORAGE_PUBLIC_URL: z.url().describe('The same store, as browsers reach it.'),
  STORAGE_BUCKET: z.string().min(1).describe('The bucket that holds the files. It must exist.'),
  STORAGE_REGION: z.string().default('us-east-1').describe('The region of the bucket.'),
  STORAGE_ACCESS_KEY: z.string().min(1).describe('The key that may read, write and delete in the bucket.'),
  STORAGE_SECRET_KEY: z.string().min(1).describe('The secret of that key.'),
  STORAGE_QUOTA_BYTES: z.coerce.number<string>().int().min(0).default(100e9).describe('Bytes of files an organisation may keep, unless it has a limit of its own.'),
  PART_ADDRESS_SECONDS: z.coerce.number<string>().int().min(1).max(604_800).default(3600).describe('How long the address of a part of an upload is good for.'),
  SMTP_URL: z.string().regex(/^smtps?:\/\//, 'expected smtp://host:port').describe('The mail server, with user and password where it wants them.'),
  MAIL_FROM: z.string().min(3).describe('The sender of mails, with or without a name: Fourfold <fourfold@example.org>.'),
  TRUSTED_PROXIES: z.string().default('').describe('Addresses, separated by commas, whose X-Forwarded-For is believed.'),
  LOG_LEVEL: z.enum(['debug', 'info', 'warn', 'error']).default('info').describe('Lines of this weight and above are written.'),
  METRICS_TOKEN: z.string().min(16).optional().describe('Whoever sends it as a bearer token may read the metrics. Unless set, only the machine itself may.'),
  METRICS_PORT: port.optional().describe('Where a worker serves its metrics: on 127.0.0.1, or with METRICS_TOKEN on every address. Unless set it serves none.'),
  WORKER_THREADS: z.coerce.number<string>().int().min(1).max(64).optional().describe('Files a worker reads at once. Unless set, one for each processor.'),
  BODY_SECONDS: seconds(1).default(30).describe('How long a client may send nothing of a body, or too little of it, before it is refused.'),
  IDLE_READER_SECONDS: seconds(1).default(60).describe('How long a client may take nothing of an answer before its connection is ended.'),
  TOKEN_REQUESTS_A_MINUTE: z.coerce.number<string>().int().min(1).default(600).describe('Requests a token may make in a minute.'),
  PERSON_REQUESTS_A_MINUTE: z.coerce.number<string>().int().min(1).default(3000).describe('Requests a person signed in may make in a minute, all sessions together.'),
  READ_STALL_SECONDS: seconds(1).default(30).describe('How long storage may send nothing of a file that is read before the reading is given up and tried again.'),
  READ_MEMORY_MB: z.coerce.number<string>().int().min(16).default(256).describe('Memory of a thread that reads a file, without its columns of numbers. A file that needs more is rejected.'),
  READ_COMPUTE_SECONDS: seconds(1).default(120).describe('Computing time a file may take at least. A second is added for every 2 MB of it.'),
  DRAIN_SECONDS: seconds(1).default(8).describe('How long a web process that is told to end waits for requests in flight. Whoever stops it must wait two seconds longer.'),
});

export type Env = z.infer<typeof envSchema>;

const backupSchema = envSchema.pick({
  STORAGE_ENDPOINT: true, STORAGE_PUBLIC_URL: true, STORAGE_BUCKET: true, STORAGE_REGION: true, STORAGE_ACCESS_KEY: true, STORAGE_SECRET_KEY: true,
  PART_ADDRESS_SECONDS: true,
}).extend({
  MAINTENANCE_DATABASE_URL: z.url().describe('PostgreSQL as the role fourfold_maintenance, which reads everything. For backups and checks.'),
  MIGRATION_DATABASE_URL: z.url().describe('PostgreSQL as the role fourfold_owner, which owns the tables. For migrations and for restoring.'),
});

function parse<S extends z.ZodType>(schema: S, source: Record<string, string | undefined>): z.output<S> {
  // Set to nothing is not set: what starts processes often has no other way to say so.
  const parsed = schema.safeParse(Object.fromEntries(Object.entries(source).filter(([, value]) => value !== '')));
  if (parsed.success) return parsed.data;
  const faults = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
  throw new Error(`The environment is not complete.\n${faults.join('\n')}`);
}

/** Reads the environment once; a missing or wrong variable stops the start and is named. */
export function readEnv(source: Record<string, string | undefined>): Env {
  return parse(envSchema, source);
}

/** What the commands that back up and restore need of the environment. */
export function readBackupEnv(source: Record<string, string | undefined>): z.infer<typeof backupSchema> {
  return parse(backupSchema, source);
}

/** A variable as a person sets it; the default is null where it must be set, and empty where it may be left out. */
export interface Variable { name: string; meaning: string; standard: string | null; isForCommands: boolean }

/** Every variable there is, from the schemas that read them. */
export function listVariables(): Variable[] {
  const own = Object.keys(envSchema.shape);
  return Object.entries({ ...envSchema.shape, ...backupSchema.shape }).map(([name, schema]) => {
    const unset = (schema as z.ZodType<string | number | undefined>).safeParse(undefined);
    const standard = unset.success ? String(unset.data ?? '') : null;
    return { name, meaning: schema.description ?? '', standard, isForCommands: !own.includes(name) };
  });
}
