import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { ApiProblem } from '@/app/_components/api/api-problem';
import type { Line, PartAnswer } from '@/app/(organisation)/[org]/studies/[id]/_components/sending/line';
import { sendParts, type PartsJob } from '@/app/(organisation)/[org]/studies/[id]/_components/sending/send-parts';

/** What the far end does with the next try of a part: an answer, or the line cut in the middle. */
type Fate = number | 'cut';
const fates = new Map<number, Fate[]>();
let kept = new Map<number, Buffer>();
let puts: number[] = [];
let signed: number[][] = [];
let waits: number[] = [];
let clock = 0;
let online = true;
let server: http.Server;
let origin = '';

beforeAll(async () => {
  server = http.createServer((request, response) => {
    const number = Number(new URL(request.url ?? '', origin).searchParams.get('part'));
    const chunks: Buffer[] = [];
    puts.push(number);
    request.on('data', (chunk: Buffer) => chunks.push(chunk));
    request.on('end', () => {
      const fate = fates.get(number)?.shift() ?? 200;
      if (fate === 'cut') { request.socket.destroy(); return; }
      if (fate === 200) kept.set(number, Buffer.concat(chunks));
      response.writeHead(fate, { etag: `"${number}"` }).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterAll(() => new Promise((resolve) => server.close(resolve)));
beforeEach(() => {
  fates.clear();
  [puts, signed, waits, clock, online] = [[], [], [], 0, true];
  kept = new Map();
});

const line: Line = {
  sign: (_upload, numbers) => {
    signed.push(numbers);
    return Promise.resolve(numbers.map((number) => ({ number, url: `${origin}/?part=${number}`, expiresAt: new Date(clock + 1000).toISOString() })));
  },
  put: async (url, part, { signal, onSent }): Promise<PartAnswer> => {
    try {
      const answer = await fetch(url, { method: 'PUT', body: part, signal });
      onSent(part.size);
      return { status: answer.status, etag: answer.ok ? answer.headers.get('etag') : null };
    } catch {
      signal.throwIfAborted();
      return { status: 0, etag: null };
    }
  },
  isOnline: () => online,
  wait: (milliseconds, signal) => {
    signal.throwIfAborted();
    waits.push(milliseconds);
    online = true;
    return Promise.resolve();
  },
  now: () => clock,
  random: () => 1,
};

const content = Buffer.from(Array.from({ length: 2500 }, (_, index) => index % 251));
function job(changes: Partial<PartsJob> = {}): PartsJob {
  const file = Object.assign(new Blob([content]), { name: 'a.csv' });
  return { upload: 'u', file, partSize: 10, stored: new Map(), signal: new AbortController().signal, onStored: () => undefined, onSent: () => undefined, onWaiting: () => undefined, ...changes };
}
const whole = () => Buffer.concat([...kept].sort(([a], [b]) => a - b).map(([, bytes]) => bytes));

describe('a file in parts', () => {
  it('arrives whole, each of 250 parts once, with no more than 100 addresses asked for at once', async () => {
    const one = job();
    await sendParts(line, one);
    expect(whole()).toEqual(content);
    expect([puts.length, one.stored.size]).toEqual([250, 250]);
    expect(Math.max(...signed.map(({ length }) => length))).toBeLessThanOrEqual(100);
    expect(signed.length).toBeLessThan(60);
  });

  it('sends only what is not stored', async () => {
    const stored = new Map(Array.from({ length: 248 }, (_, index) => [index + 1, 'kept']));
    await sendParts(line, job({ stored }));
    expect(puts.sort()).toEqual([249, 250]);
  });

  it('tries a part again after a cut line and after 5xx, later each time', async () => {
    fates.set(2, ['cut', 503, 500]);
    await sendParts(line, job({ partSize: 1000 }));
    expect(whole()).toEqual(content);
    expect(waits).toEqual([1000, 2000, 4000]);
  });

  it('asks for a new address after 403, without waiting and without end', async () => {
    const renewing: Line = { ...line, sign: async (upload, numbers) => { clock += 2000; return line.sign(upload, numbers); } };
    for (let number = 1; number <= 3; number += 1) fates.set(number, [403, 403]);
    await sendParts(renewing, job({ partSize: 1000 }));
    expect(whole()).toEqual(content);
    expect(waits).toEqual([]);
  });

  it('does not use an address past its time', async () => {
    const late: Line = { ...line, put: (url, part, options) => { clock += 600; return line.put(url, part, options); } };
    await sendParts(late, job({ partSize: 100 }));
    expect(whole()).toEqual(content);
    expect(signed.length).toBeGreaterThan(5);
  });

  it('gives up a part that never gets through, and stops the others', async () => {
    fates.set(1, Array.from({ length: 20 }, () => 503));
    await expect(sendParts(line, job({ partSize: 1000 }))).rejects.toMatchObject({ kind: 'line' });
    fates.set(1, Array.from({ length: 200 }, () => 403));
    await expect(sendParts(line, job({ partSize: 1000 }))).rejects.toMatchObject({ kind: 'line' });
  });

  it('waits out the time without a network: that is no failure', async () => {
    fates.set(1, Array.from({ length: 20 }, () => 'cut' as const));
    const off: Line = { ...line, put: (url, part, options) => { online = !url.endsWith('part=1'); return line.put(url, part, options); } };
    await sendParts(off, job({ partSize: 1000 }));
    expect(whole()).toEqual(content);
  });

  it('ends where the upload is gone, and where the server refuses', async () => {
    fates.set(1, [404]);
    await expect(sendParts(line, job({ partSize: 1000 }))).rejects.toMatchObject({ kind: 'gone' });
    const refusing: Line = { ...line, sign: () => Promise.reject(new ApiProblem({ title: '', status: 409, detail: 'Another upload has taken the place of this one.', errors: [] })) };
    await expect(sendParts(refusing, job())).rejects.toMatchObject({ kind: 'refused', message: 'Another upload has taken the place of this one.' });
  });

  it('says that the file changed where it cannot be read any more', async () => {
    const file = Object.assign(new Blob([content]), { name: 'a.csv' });
    const gone = { size: 10, slice: () => ({ arrayBuffer: () => Promise.reject(new Error('NotReadableError')) }) } as unknown as Blob;
    file.slice = () => gone;
    const broken: Line = { ...line, put: () => Promise.resolve({ status: 0, etag: null }) };
    await expect(sendParts(broken, job({ file }))).rejects.toMatchObject({ kind: 'changed', message: 'a.csv changed on disk while it was being sent. Choose it again once it is written.' });
  });

  it('stops at once when told to, keeping what is stored', async () => {
    const stop = new AbortController();
    const one = job({ signal: stop.signal });
    one.onStored = () => { if (one.stored.size === 5) stop.abort(); };
    await expect(sendParts(line, one)).rejects.toMatchObject({ name: 'AbortError' });
    expect(one.stored.size).toBeLessThan(10);
  });
});
