import { beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract, getCodeContract, listCodesContract } from '@/lib/domain/codes/schema';
import { ok, refused, send } from '../support/api';
import { signUp, type Person } from '../support/people';

let person: Person;
let stranger: Person;
beforeAll(async () => {
  person = await signUp('Code Works');
  stranger = await signUp('Stranger Works');
});

describe('POST /api/v1/codes', () => {
  it('answers with what its GET gives, by slug and by id', async () => {
    const made = await ok(person, createCodeContract, { body: { name: 'Brack Überlauf' } });
    expect(made.slug).toBe('brack-uberlauf');
    expect(await ok(person, getCodeContract, { params: { code: made.slug } })).toEqual(made);
    expect(await ok(person, getCodeContract, { params: { code: made.id } })).toEqual(made);
  });

  it('answers 409 naming the slug when it is taken, and takes the same one in another organisation', async () => {
    const body = { name: 'Brack', slug: 'brack' };
    await ok(person, createCodeContract, { body });
    expect(await refused(person, createCodeContract, { body })).toMatchObject({ status: 409, errors: [{ path: 'slug' }] });
    await ok(stranger, createCodeContract, { body });
  });

  it('answers a repeated Idempotency-Key as before, and another body under it with 422', async () => {
    const sent = { body: { name: 'Once' }, headers: { 'idempotency-key': 'once-1' } };
    const made = await ok(person, createCodeContract, sent);
    expect(await ok(person, createCodeContract, sent)).toEqual(made);
    expect((await refused(person, createCodeContract, { ...sent, body: { name: 'Twice' } })).status).toBe(422);
  });

  it('answers 400 to what is no JSON and 413 to more than a mebibyte', async () => {
    const json = { 'content-type': 'application/json' };
    expect((await send(person, createCodeContract, { body: '{"name":', headers: json })).status).toBe(400);
    expect((await send(person, createCodeContract, { body: `{"name":"${'a'.repeat(1_100_000)}"}`, headers: json })).status).toBe(413);
  });
});

describe('GET /api/v1/codes', () => {
  it('pages by cursor, newest first, and ends', async () => {
    const own = await signUp('Paging Works');
    const names = ['One', 'Two', 'Three'];
    for (const name of names) await ok(own, createCodeContract, { body: { name } });
    const first = await ok(own, listCodesContract, { query: { limit: 2 } });
    expect(first.items.map((code) => code.name)).toEqual(['Three', 'Two']);
    const second = await ok(own, listCodesContract, { query: { limit: 2, cursor: first.nextCursor ?? '' } });
    expect(second).toMatchObject({ items: [{ name: 'One' }], nextCursor: null });
  });

  it('answers 422 to a limit over 200 and 400 to a cursor no list gave', async () => {
    expect((await refused(person, listCodesContract, { query: { limit: 201 } })).status).toBe(422);
    expect((await refused(person, listCodesContract, { query: { cursor: 'page-2' } })).status).toBe(400);
  });
});

describe('GET /api/v1/codes/{code}', () => {
  it('answers 404 for another organisation’s code, by id and by name of the organisation', async () => {
    const made = await ok(stranger, createCodeContract, { body: { name: 'Secret' } });
    expect((await refused(person, getCodeContract, { params: { code: made.id } })).status).toBe(404);
    expect((await refused({ ...person, organisation: stranger.at.slug }, getCodeContract, { params: { code: made.id } })).status).toBe(404);
  });
});
