import { beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract, getCodeContract, listCodesContract, updateReleaseContract } from '@/lib/domain/codes/schema';
import { createProblemContract, getProblemContract } from '@/lib/domain/problems/schema';
import { createStudyContract, getStudyContract, listStudiesContract } from '@/lib/domain/studies/schema';
import { ifMatch, ok, refused } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { signUp, type Person } from '@/tests/support/people';
import { makeWork, type Work } from '@/tests/support/work';

let person: Person;
let work: Work;
beforeAll(async () => {
  person = await signUp('Odd Requests');
  work = await makeWork(person);
});

describe('requests that no database could take', () => {
  it.each(['a\0b', 'a\ud800b'])('refuses %j in a body, naming the member', async (name) => {
    expect(await refused(person, createCodeContract, { body: JSON.stringify({ name }), headers: { 'content-type': 'application/json' } }))
      .toMatchObject({ status: 422, errors: [{ path: 'name' }] });
    const constants = { [name]: 1 };
    const body = JSON.stringify({ name: 'Odd', equation: 'none', dimension: 1, constants });
    expect((await refused(person, createProblemContract, { body, headers: { 'content-type': 'application/json' } })).status).toBe(422);
  });

  it('refuses a NUL in the path and in the query', async () => {
    expect((await refused(person, getCodeContract, { params: { code: 'a\0' } })).status).toBe(400);
    expect((await refused(person, listStudiesContract, { query: { case: 'a\0' } })).status).toBe(400);
  });

  it('refuses an address that cannot be decoded', async () => {
    for (const address of ['/api/v1/codes/%ff', '/api/v1/codes/%E0%A4%A', '/%ff']) {
      const response = await fetch(`${need('WEB_URL')}${address}`);
      expect([response.status, response.headers.get('content-type')]).toEqual([400, 'application/problem+json']);
    }
  });

  it('refuses revisions beyond any that could be', async () => {
    const params = { code: work.code.slug, version: work.release.version };
    expect((await refused(person, updateReleaseContract, { params, body: { state: 'current' }, ...ifMatch(99_999_999_999) })).status).toBe(400);
    const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: [{ label: 'n8', cells: 64 }] } });
    expect((await refused(person, getStudyContract, { params: { id: study.id }, query: { revision: 99_999_999_999 } })).status).toBe(422);
    expect((await refused(person, getStudyContract, { params: { id: study.id }, query: { revision: 9 } })).status).toBe(404);
  });

  it('refuses an Idempotency-Key over 255 characters and keeps one of 255', async () => {
    const key = (length: number) => ({ 'idempotency-key': Array.from({ length }, (_, index) => index.toString(36)).join('').slice(0, length) });
    expect((await refused(person, createCodeContract, { body: { name: 'Long key' }, headers: key(256) })).status).toBe(400);
    const first = await ok(person, createCodeContract, { body: { name: 'Long key' }, headers: key(255) });
    expect(await ok(person, createCodeContract, { body: { name: 'Long key' }, headers: key(255) })).toEqual(first);
  });

  it('refuses JSON nested deeper than anything it knows, or of more members or longer texts', async () => {
    const headers = { 'content-type': 'application/json' };
    const refusal = (value: string) => refused(person, createCodeContract, { body: `{"name":${value}}`, headers });
    expect(await refusal(`${'['.repeat(200_000)}${']'.repeat(200_000)}`))
      .toMatchObject({ status: 400, detail: 'The body is nested deeper than 32 levels at byte 40. No call takes more than a few: send it flatter.' });
    expect(await refusal(`[${'0,'.repeat(60_000)}0]`)).toMatchObject({ status: 413, detail: expect.stringContaining('more than 50000 members and values') as string });
    expect(await refusal(`"${'a'.repeat(100_001)}"`)).toMatchObject({ status: 413, detail: 'The text that begins at byte 9 is longer than 100000 characters. Shorten it.' });
    expect((await refused(person, createProblemContract, { body: '{"name":"n","equation":"none","dimension":1,"constants":{"k":1e999}}', headers })))
      .toMatchObject({ status: 422, errors: [{ path: 'constants.k' }] });
  });

  it('refuses expressions that would keep it busy, and at once', async () => {
    const refusal = (constants: Record<string, string>) => refused(person, createProblemContract, { body: { name: 'Busy', equation: 'none', dimension: 1, constants } });
    const many = (count: number, source: (index: number) => string) => Object.fromEntries(Array.from({ length: count }, (_, index) => [`c${index}`, source(index)]));
    const begun = performance.now();
    expect(await refusal(many(20_000, () => 'q'))).toMatchObject({ status: 422, detail: expect.stringContaining('at most 300 are read') as string });
    expect(await refusal(many(200, (index) => (index === 199 ? 'x' : `c${index + 1}`)))).toMatchObject({ status: 422, errors: expect.any(Array) as [] });
    expect(await refusal({ a: `${'('.repeat(500)}x${')'.repeat(500)}` })).toMatchObject({ status: 422, detail: expect.stringContaining('100 parentheses') as string });
    expect(performance.now() - begun).toBeLessThan(3000);
  });
});

describe('names that mean something else', () => {
  it('gives a problem called New an address of its own', async () => {
    const made = await ok(person, createProblemContract, { body: { name: 'New', equation: 'none', dimension: 1 } });
    expect(made.slug).toBe('new-1');
    expect((await ok(person, getProblemContract, { params: { problem: 'new-1' } })).name).toBe('New');
    expect((await refused(person, createProblemContract, { body: { name: 'Again', slug: 'new', equation: 'none', dimension: 1 } })).status).toBe(422);
  });

  it('takes fields and constants called like members of every object', async () => {
    const body = { name: 'Members', equation: 'none', dimension: 1, constants: { constructor: 2 }, exact: { valueOf: 'constructor*x' } } as const;
    expect(await ok(person, createProblemContract, { body })).toMatchObject({ constants: { constructor: 2 }, exact: { valueOf: 'constructor*x' } });
  });
});

describe('lists', () => {
  it('give every item once, page by page, whatever is made meanwhile', async () => {
    const own = await signUp('Lists');
    const make = (name: string) => ok(own, createCodeContract, { body: { name } });
    const made = [await make('One'), await make('Two'), await make('Three'), await make('Four'), await make('Five')];
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const page: { items: { slug: string }[]; nextCursor: string | null } = await ok(own, listCodesContract, { query: { limit: 2, ...(cursor === null ? {} : { cursor }) } });
      seen.push(...page.items.map(({ slug }) => slug));
      if (cursor === null) await make('Late');
      cursor = page.nextCursor;
    } while (cursor !== null);
    expect(seen).toEqual(made.map(({ slug }) => slug).reverse());
    for (const limit of [0, 201, 'ten']) expect((await refused(own, listCodesContract, { query: { limit } })).status).toBe(422);
  });
});
