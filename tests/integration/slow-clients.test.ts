import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { startWeb, type ExtraProcess } from '@/tests/support/extra-process';
import { makeToken, signUp } from '@/tests/support/people';
import { sendSlowly, untilCut } from '@/tests/support/slow-client';
import { makeWork } from '@/tests/support/work';

const port = Number(new URL(need('WEB_URL')).port) + 5;
const base = `http://127.0.0.1:${port}`;
let web: ExtraProcess;
let token: { token: string };
let study: Study;
let headers: Record<string, string>;

beforeAll(async () => {
  web = await startWeb('web-slow', port, { BODY_SECONDS: '1', IDLE_READER_SECONDS: '2' });
  const person = await signUp('Slow Clients');
  const work = await makeWork(person);
  token = await makeToken(person, { scopes: ['read', 'write'] });
  headers = { authorization: `Bearer ${token.token}` };
  study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: [{ label: 'n8', cells: 64 }] } });
});
afterAll(() => web.end());

function* again(piece: string | Buffer, times: number): Generator<string | Buffer> {
  for (let count = 0; count < times; count += 1) yield piece;
}
const slowJson = (pieces: Iterable<string>, everyMilliseconds: number) => sendSlowly(base, {
  method: 'POST', path: '/api/v1/codes', headers: { ...headers, 'content-type': 'application/json' }, pieces, everyMilliseconds,
});
const dataPath = () => `/api/v1/studies/${study.id}/grids/n8/data`;
const slowFile = (pieces: Iterable<string | Buffer>, everyMilliseconds: number) => sendSlowly(base, { method: 'PUT', path: dataPath(), headers, pieces, everyMilliseconds });

describe('a client that sends too slowly', () => {
  it('is answered 408 with what was expected, for JSON and for files, and nothing is kept', async () => {
    const [silent, trickling, file] = await Promise.all([
      slowJson(['{"name":'], 20_000), slowJson(again(' ', 100) as Iterable<string>, 200), slowFile(again('1,2,3\n', 100), 100),
    ]);
    expect(silent).toMatchObject({ status: 408, body: { type: '/docs/problems#too-slow', detail: expect.stringContaining('8 bytes arrived') as string } });
    expect(trickling).toMatchObject({ status: 408, body: { detail: expect.stringContaining('the whole within 2 s') as string } });
    expect(file).toMatchObject({ status: 408, body: { detail: expect.stringContaining('at least 32 KiB in every 1 s') as string } });
    expect((await ok(token, getStudyContract, { params: { id: study.id } })).grids[0]?.state).toBe('expected');
  });

  it('may take as long as it likes over a file that keeps coming', async () => {
    const row = Buffer.from('0.1,0.2,0.3,0.4\n'.repeat(2560));
    expect((await slowFile([Buffer.from('x,y,w,T\n'), ...again(row, 8)], 350)).status).toBe(202);
  });
});

describe('a connection that goes nowhere', () => {
  it('is ended: headers without an end, a body that nobody wants, an answer that nobody takes', async () => {
    const document = `GET /api/v1/openapi.json HTTP/1.1\r\nhost: ${new URL(base).host}\r\n\r\n`;
    const body = `host: ${new URL(base).host}\r\ncontent-length: 100000000\r\n\r\n`;
    const [unfinished, unwanted, page, untaken] = await Promise.all([
      untilCut(base, 'GET / HTTP/1.1\r\nhost: a\r\nx-a: ', { onward: 'a' }),
      untilCut(base, `POST /api/v1/nothing HTTP/1.1\r\n${body}`, { onward: 'a' }),
      untilCut(base, `POST /sign-in HTTP/1.1\r\n${body}`, { onward: 'a' }),
      untilCut(base, document.repeat(400), { onward: document, isReading: false }),
    ]);
    expect(unfinished).toBeLessThan(4);
    expect(unwanted).toBeLessThan(8);
    expect(page).toBeLessThan(10);
    expect(untaken).toBeGreaterThan(1.5);
    expect(untaken).toBeLessThan(10);
    expect((await fetch(`${base}/api/v1/health`)).status).toBe(200);
  });
});
