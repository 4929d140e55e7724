import { CreateBucketCommand, S3Client } from '@aws-sdk/client-s3';
import { Client } from 'pg';
import { adminDatabase } from './admin-database';
import { need } from './environment';

const withDatabase = (url: string, name: string) => Object.assign(new URL(url), { pathname: `/${name}` }).toString();

/** Asks something of the second database, as the role of the address. */
export async function askSecondHome(url: string, queries: string[]): Promise<object[][]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    const answers: object[][] = [];
    for (const query of queries) answers.push((await client.query<object>(query)).rows);
    return answers;
  } finally {
    await client.end();
  }
}

/** A database of its own on the same server, made as docker/postgres/roles.sql makes one, and a bucket of its own. */
export async function makeSecondHome(name: string): Promise<Record<string, string>> {
  const admin = adminDatabase();
  await admin.query(`drop database if exists ${name}`);
  await admin.query(`create database ${name} owner fourfold_owner`);
  await admin.query(`revoke all on database ${name} from public`);
  await admin.query(`grant connect on database ${name} to fourfold_app, fourfold_maintenance`);
  await askSecondHome(withDatabase(need('TEST_ADMIN_DATABASE_URL'), name), [
    'grant usage on schema public to fourfold_app, fourfold_maintenance', 'grant usage, create on schema public to fourfold_lookup',
  ]);

  const bucket = name.replaceAll('_', '-');
  const client = new S3Client({
    endpoint: need('STORAGE_ENDPOINT'), region: need('STORAGE_REGION'), forcePathStyle: true, requestChecksumCalculation: 'WHEN_REQUIRED',
    credentials: { accessKeyId: need('STORAGE_ACCESS_KEY'), secretAccessKey: need('STORAGE_SECRET_KEY') },
  });
  await client.send(new CreateBucketCommand({ Bucket: bucket }));
  client.destroy();
  const urls = ['DATABASE_URL', 'MIGRATION_DATABASE_URL', 'MAINTENANCE_DATABASE_URL', 'TEST_ADMIN_DATABASE_URL'];
  return { ...Object.fromEntries(urls.map((variable) => [variable, withDatabase(need(variable), name)])), STORAGE_BUCKET: bucket };
}
