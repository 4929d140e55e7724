import { beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract, getCodeContract, listCodesContract, type Code } from '@/lib/domain/codes/schema';
import { meContract } from '@/lib/domain/people/schema';
import { createProblemContract, listProblemsContract } from '@/lib/domain/problems/schema';
import { createTokenContract, deleteTokenContract, listTokensContract } from '@/lib/domain/tokens/schema';
import { adminDatabase } from '../support/admin-database';
import { ok, refused } from '../support/api';
import { addMember, makeToken, signUp, type Person } from '../support/people';
import { heatProblem } from '../support/work';

let person: Person;
let code: Code;
let other: Code;
beforeAll(async () => {
  person = await signUp('Token Works');
  code = await ok(person, createCodeContract, { body: { name: 'Brack' } });
  other = await ok(person, createCodeContract, { body: { name: 'Weir' } });
});

describe('POST /api/v1/tokens', () => {
  it('shows the secret once and stores its hash only', async () => {
    const made = await ok(person, createTokenContract, { body: { name: 'nightly', scopes: ['write', 'read', 'read'], code: code.slug } });
    expect(made).toMatchObject({ name: 'nightly', code: code.slug, scopes: ['write', 'read'], expiresAt: null, lastUsedAt: null });
    expect(made.token).toMatch(/^fft_[A-Za-z0-9_-]{43}$/);
    const { rows } = await adminDatabase().query("select encode(secret_sha256, 'hex') = encode(sha256($2::bytea), 'hex') as matches from api_tokens where id = $1", [made.id, made.token]);
    expect(rows).toEqual([{ matches: true }]);
    expect(JSON.stringify(await ok(person, listTokensContract, {}))).not.toContain(made.token);
  });

  it('answers 422 for an end that is past', async () => {
    const problem = await refused(person, createTokenContract, { body: { name: 'late', scopes: ['read'], expiresAt: '2020-01-01T00:00:00Z' } });
    expect(problem).toMatchObject({ status: 422, errors: [{ path: 'expiresAt' }] });
  });

  it('answers 404 for a code of another organisation', async () => {
    const stranger = await signUp('Stranger Works');
    expect((await refused(stranger, createTokenContract, { body: { name: 'far', scopes: ['read'], code: code.id } })).status).toBe(404);
  });

  it('answers 403 to a token', async () => {
    const token = await makeToken(person, { scopes: ['read', 'write'] });
    expect((await refused(token, createTokenContract, { body: { name: 'more', scopes: ['write'] } })).status).toBe(403);
  });

  it('makes tokens that reach no further than their code', async () => {
    const token = await makeToken(person, { scopes: ['read', 'write'], code: code.slug });
    expect((await ok(token, listCodesContract, {})).items.map((each) => each.slug)).toEqual([code.slug]);
    expect((await refused(token, getCodeContract, { params: { code: other.slug } })).status).toBe(404);
    expect((await refused(token, createCodeContract, { body: { name: 'Third' } })).status).toBe(403);
    expect((await refused(token, createProblemContract, { body: heatProblem })).status).toBe(403);
    await ok(token, listProblemsContract, {});
  });

  it('makes tokens that reach no further than their scopes', async () => {
    const token = await makeToken(person, { scopes: ['read'] });
    await ok(token, listCodesContract, {});
    expect((await refused(token, createCodeContract, { body: { name: 'Fourth' } })).status).toBe(403);
  });

  it('makes tokens that can write and not read, or read and not write', async () => {
    const [writing, reading] = [await makeToken(person, { scopes: ['write'] }), await makeToken(person, { scopes: ['read'] })];
    expect((await refused(writing, listCodesContract, {})).status).toBe(403);
    await ok(writing, createCodeContract, { body: { name: 'Made by a token' } });
    expect((await refused(reading, createCodeContract, { body: { name: 'Not made' } })).status).toBe(403);
  });

  it('makes tokens that end at their time', async () => {
    const token = await makeToken(person, { scopes: ['read'] });
    const { token: shown } = await ok(token, meContract, {});
    await adminDatabase().query("update api_tokens set expires_at = now() - interval '1 second' where id = $1", [shown?.id]);
    expect((await refused(token, meContract, {})).status).toBe(401);
  });
});

describe('GET /api/v1/tokens', () => {
  it('lists own tokens only, newest first, page by page, with their last use', async () => {
    const engineer = await addMember(person.at, ['engineer']);
    const [first, second] = [await makeToken(engineer, { scopes: ['read'] }), await makeToken(engineer, { scopes: ['write'] })];
    await ok(first, meContract, {});
    const page = await ok(engineer, listTokensContract, { query: { limit: 1 } });
    expect(page.items).toMatchObject([{ scopes: ['write'], lastUsedAt: null }]);
    const rest = await ok(engineer, listTokensContract, { query: { limit: 1, cursor: page.nextCursor ?? '' } });
    expect(rest.items).toMatchObject([{ scopes: ['read'] }]);
    expect(rest.items[0]?.lastUsedAt).not.toBeNull();
    expect(rest.nextCursor).toBeNull();
    expect(second.token).not.toBe(first.token);
  });
});

describe('DELETE /api/v1/tokens/{id}', () => {
  it('withdraws a token: its next call is refused', async () => {
    const made = await ok(person, createTokenContract, { body: { name: 'short-lived', scopes: ['read'] } });
    await ok({ token: made.token }, meContract, {});
    await ok(person, deleteTokenContract, { params: { id: made.id } });
    expect((await refused({ token: made.token }, meContract, {})).status).toBe(401);
    expect((await refused(person, deleteTokenContract, { params: { id: made.id } })).status).toBe(404);
  });

  it('answers 404 for a colleague’s token and for what is no id', async () => {
    const engineer = await addMember(person.at, ['engineer']);
    const made = await ok(person, createTokenContract, { body: { name: 'mine', scopes: ['read'] } });
    expect((await refused(engineer, deleteTokenContract, { params: { id: made.id } })).status).toBe(404);
    expect((await refused(person, deleteTokenContract, { params: { id: 'mine' } })).status).toBe(404);
  });
});
