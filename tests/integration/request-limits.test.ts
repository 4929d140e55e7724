import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract, type Study } from '@/lib/domain/studies/schema';
import { ok, type Problem } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { startWeb, type ExtraProcess } from '@/tests/support/extra-process';
import { makeToken, signUp, type Person } from '@/tests/support/people';
import { makeWork } from '@/tests/support/work';

const port = Number(new URL(need('WEB_URL')).port) + 6;
const base = `http://127.0.0.1:${port}`;
let web: ExtraProcess;
let person: Person;
let study: Study;

beforeAll(async () => {
  web = await startWeb('web-limits', port, { TOKEN_REQUESTS_A_MINUTE: '110', PERSON_REQUESTS_A_MINUTE: '120' });
  person = await signUp('Request Limits');
  const work = await makeWork(person);
  study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: [{ label: 'n8', cells: 64 }] } });
});
afterAll(() => web.end());

type Sender = Record<string, string>;
const bearer = async (): Promise<Sender> => ({ authorization: `Bearer ${(await makeToken(person, { scopes: ['read'] })).token}` });
const call = (path: string, headers: Sender) => fetch(`${base}/api/v1${path}`, { headers });

async function statusesOf(count: number, headers: Sender): Promise<number[]> {
  const statuses: number[] = [];
  for (let calls = 0; calls < count; calls += 1) {
    const response = await call('/me', headers);
    await response.arrayBuffer();
    statuses.push(response.status);
  }
  return statuses;
}

describe('requests a minute', () => {
  it('are counted for each token by itself, then answered 429 with Retry-After', async () => {
    const [first, second] = [await bearer(), await bearer()];
    expect(await statusesOf(112, first)).toEqual([...Array<number>(110).fill(200), 429, 429]);
    expect(await statusesOf(1, second)).toEqual([200]);
    const refused = await call('/me', first);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
    expect(await refused.json()).toMatchObject({ status: 429, detail: expect.stringContaining('more than 110 requests in a minute') as string });
  });

  it('are counted for a person over all sessions', async () => {
    const { cookie } = await signUp('Many Requests');
    expect(await statusesOf(122, { cookie })).toEqual([...Array<number>(120).fill(200), 429, 429]);
  });
});

describe('what keeps a connection open', () => {
  it('is bounded per caller, and free again once it ends', async () => {
    const headers = await bearer();
    const open = async (path: string, count: number) => {
      const abort = new AbortController();
      const calls = Array.from({ length: count }, () => fetch(`${base}/api/v1/studies/${study.id}${path}`, { headers, signal: abort.signal }));
      const settled = await Promise.all(calls.map((each) => Promise.race([each, new Promise<null>((resolve) => setTimeout(resolve, 1000, null))])));
      const refused = await Promise.all(settled.flatMap((each) => (each?.status === 429 ? [each.json() as Promise<Problem>] : [])));
      abort.abort();
      await Promise.allSettled(calls);
      return refused.map(({ detail }) => detail);
    };
    expect(await open('/events', 42)).toEqual(Array(2).fill(expect.stringContaining('40 event streams are open')));
    expect(await open('/outcome?wait=30', 23)).toEqual(Array(3).fill(expect.stringContaining('20 calls that wait for an outcome are open')));
    expect(await open('/events', 40)).toEqual([]);
  });
});
