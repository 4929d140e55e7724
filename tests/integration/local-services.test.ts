import fs from 'node:fs';
import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  ListPartsCommand,
  S3Client,
  UploadPartCommand,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { Redis } from 'ioredis';
import nodemailer from 'nodemailer';
import { afterAll, describe, expect, it } from 'vitest';
import { queryOnce } from '../support/query-once';

function need(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set: run these tests by npm test.`);
  return value;
}

const Bucket = need('STORAGE_BUCKET');
const storage = new S3Client({
  endpoint: need('STORAGE_ENDPOINT'),
  region: need('STORAGE_REGION'),
  forcePathStyle: true,
  requestChecksumCalculation: 'WHEN_REQUIRED',
  responseChecksumValidation: 'WHEN_REQUIRED',
  credentials: { accessKeyId: need('STORAGE_ACCESS_KEY'), secretAccessKey: need('STORAGE_SECRET_KEY') },
});
const FIVE_MEBIBYTES = 5 * 1024 * 1024;

afterAll(() => storage.destroy());

async function beginUpload(Key: string): Promise<string> {
  const { UploadId } = await storage.send(new CreateMultipartUploadCommand({ Bucket, Key }));
  if (!UploadId) throw new Error('The store gave no upload id.');
  return UploadId;
}

describe('the object store', () => {
  it('keeps a file sent in parts and gives back the same bytes', async () => {
    const Key = 'local-services/whole';
    const UploadId = await beginUpload(Key);
    const bodies = [Buffer.alloc(FIVE_MEBIBYTES, 'a'), Buffer.from('the rest')];
    const Parts = await Promise.all(
      bodies.map(async (Body, index) => {
        const PartNumber = index + 1;
        const { ETag } = await storage.send(new UploadPartCommand({ Bucket, Key, UploadId, PartNumber, Body }));
        return { ETag, PartNumber };
      }),
    );
    const listed = await storage.send(new ListPartsCommand({ Bucket, Key, UploadId }));
    expect(listed.Parts?.map((part) => part.Size)).toEqual([FIVE_MEBIBYTES, 8]);
    await storage.send(new CompleteMultipartUploadCommand({ Bucket, Key, UploadId, MultipartUpload: { Parts } }));
    const { Body } = await storage.send(new GetObjectCommand({ Bucket, Key }));
    expect(Buffer.from((await Body?.transformToByteArray()) ?? []).equals(Buffer.concat(bodies))).toBe(true);
    await storage.send(new DeleteObjectCommand({ Bucket, Key }));
  });

  it('forgets an upload that is given up', async () => {
    const Key = 'local-services/given-up';
    const UploadId = await beginUpload(Key);
    await storage.send(new UploadPartCommand({ Bucket, Key, UploadId, PartNumber: 1, Body: 'part' }));
    await storage.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }));
    await expect(storage.send(new ListPartsCommand({ Bucket, Key, UploadId }))).rejects.toThrow();
  });

  it('takes a presigned part from the web pages, on 127.0.0.1 and on localhost, and from no other', async () => {
    const Key = 'local-services/presigned';
    const UploadId = await beginUpload(Key);
    const command = new UploadPartCommand({ Bucket, Key, UploadId, PartNumber: 1 });
    const url = await getSignedUrl(storage, command, { expiresIn: 60 });
    const web = new URL(need('WEB_URL'));
    for (const Origin of [web.origin, `http://localhost:${web.port}`]) {
      const asked = await fetch(url, {
        method: 'OPTIONS',
        headers: { Origin, 'Access-Control-Request-Method': 'PUT', 'Access-Control-Request-Headers': 'content-type' },
      });
      expect(asked.status).toBe(200);
      const sent = await fetch(url, { method: 'PUT', headers: { Origin }, body: 'part' });
      expect(sent.status).toBe(200);
      expect(sent.headers.get('access-control-allow-origin')).toBe(Origin);
      expect(sent.headers.get('access-control-expose-headers')?.toLowerCase()).toContain('etag');
    }
    const Origin = 'http://elsewhere.example';
    const refused = await fetch(url, { method: 'OPTIONS', headers: { Origin, 'Access-Control-Request-Method': 'PUT' } });
    expect(refused.ok).toBe(false);
    const stranger = await fetch(url, { method: 'PUT', headers: { Origin }, body: 'part' });
    expect(stranger.headers.get('access-control-allow-origin')).toBeNull();
    await storage.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }));
  });

  it('refuses a wrong signature', async () => {
    const url = new URL(await getSignedUrl(storage, new GetObjectCommand({ Bucket, Key: 'any' }), { expiresIn: 60 }));
    url.searchParams.set('X-Amz-Signature', '0'.repeat(64));
    expect((await fetch(url)).status).toBe(403);
  });
});

describe('the mail server', () => {
  it('keeps a message in the inbox and sends it nowhere', async () => {
    const to = `reader-${Date.now()}@northmoor.example`;
    const transport = nodemailer.createTransport(need('SMTP_URL'));
    await transport.sendMail({
      from: 'fourfold@northmoor.example',
      to,
      subject: 'Order of <pressure>',
      text: 'Read http://127.0.0.1/study',
      html: '<p>Read <b>it</b><script>alert(1)</script></p>',
    });
    transport.close();
    const inbox = need('INBOX_URL');
    const listed = (await (await fetch(`${inbox}/messages?to=${to}`)).json()) as { id: string; subject: string }[];
    expect(listed.map((message) => message.subject)).toEqual(['Order of <pressure>']);
    const id = listed[0]?.id ?? '';
    expect(await (await fetch(inbox)).text()).toContain('Order of &#60;pressure&#62;');
    expect(await (await fetch(`${inbox}/message/${id}`)).text()).toContain('href="http://127.0.0.1/study"');
    const html = await fetch(`${inbox}/message/${id}/html`);
    expect(html.headers.get('content-security-policy')).toContain('sandbox');
    expect(await (await fetch(`${inbox}/message/${id}/source`)).text()).toContain(`To: ${to}`);
    expect((await fetch(`${inbox}/message/nothing`)).status).toBe(404);
  });
});

describe('the queue', () => {
  it('never drops a key to make room, and writes what it takes to disk', async () => {
    const redis = new Redis(need('REDIS_URL'));
    expect(await redis.config('GET', 'maxmemory-policy')).toEqual(['maxmemory-policy', 'noeviction']);
    expect(await redis.config('GET', 'appendonly')).toEqual(['appendonly', 'yes']);
    await redis.quit();
  });
});

describe('the database roles', () => {
  it.each([
    ['DATABASE_URL', 'fourfold_app', false],
    ['MIGRATION_DATABASE_URL', 'fourfold_owner', false],
    ['MAINTENANCE_DATABASE_URL', 'fourfold_maintenance', true],
  ])('%s is %s, never a superuser', async (variable, role, bypassesPolicies) => {
    const rows = await queryOnce(
      need(variable),
      'select rolname, rolsuper, rolbypassrls from pg_roles where rolname = current_user',
    );
    expect(rows).toEqual([{ rolname: role, rolsuper: false, rolbypassrls: bypassesPolicies }]);
  });
});

describe('every local service', () => {
  it('listens on 127.0.0.1 alone', () => {
    const wanted = [
      ...['WEB_URL', 'INBOX_URL', 'STORAGE_ENDPOINT', 'SMTP_URL', 'REDIS_URL', 'DATABASE_URL'].map((name) =>
        Number(new URL(need(name)).port),
      ),
      ...[1, 2, 3].map((offset) => Number(new URL(need('STORAGE_ENDPOINT')).port) + offset),
    ];
    const LISTENING = '0A';
    const addresses = ['/proc/net/tcp', '/proc/net/tcp6'].flatMap((file) =>
      fs
        .readFileSync(file, 'utf8')
        .split('\n')
        .slice(1)
        .map((line) => line.trim().split(/\s+/))
        .filter((columns) => columns[3] === LISTENING)
        .map((columns) => columns[1]?.split(':') ?? [])
        .map(([address, port]) => ({ address, port: parseInt(port ?? '', 16) })),
    );
    for (const port of wanted) {
      expect(addresses.filter((entry) => entry.port === port)).toEqual([{ address: '0100007F', port }]);
    }
  });
});
