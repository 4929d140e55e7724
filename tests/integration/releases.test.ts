import { beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract, createReleaseContract, listReleasesContract, updateReleaseContract, type Code } from '@/lib/domain/codes/schema';
import { ifMatch, ok, refused, send } from '../support/api';
import { makeToken, signUp, type Person } from '../support/people';

let person: Person;
let code: Code;
beforeAll(async () => {
  person = await signUp('Release Works');
  code = await ok(person, createCodeContract, { body: { name: 'Brack' } });
});

describe('POST /api/v1/codes/{code}/releases', () => {
  it('makes a planned release', async () => {
    const made = await ok(person, createReleaseContract, { params: { code: code.slug }, body: { version: '2.4.0', commit: '9f1c2ab' } });
    expect(made).toMatchObject({ version: '2.4.0', commit: '9f1c2ab', state: 'planned', revision: 1 });
  });

  it('answers 409 naming the version when it is there, 422 when it cannot stand in a path', async () => {
    const to = { params: { code: code.id } };
    await ok(person, createReleaseContract, { ...to, body: { version: '2.4.1' } });
    expect(await refused(person, createReleaseContract, { ...to, body: { version: '2.4.1' } })).toMatchObject({ status: 409, errors: [{ path: 'version' }] });
    expect((await refused(person, createReleaseContract, { ...to, body: { version: '2/4' } })).status).toBe(422);
  });

  it('answers 404 for another organisation’s code and for a token of another code', async () => {
    const stranger = await signUp('Stranger Works');
    const body = { version: '9.0.0' };
    expect((await refused(stranger, createReleaseContract, { params: { code: code.id }, body })).status).toBe(404);
    const other = await ok(person, createCodeContract, { body: { name: 'Weir' } });
    const token = await makeToken(person, { scopes: ['write'], code: other.slug });
    expect((await refused(token, createReleaseContract, { params: { code: code.slug }, body })).status).toBe(404);
    await ok(token, createReleaseContract, { params: { code: other.slug }, body });
  });
});

describe('GET /api/v1/codes/{code}/releases', () => {
  it('lists the newest first', async () => {
    const own = await ok(person, createCodeContract, { body: { name: 'Listed' } });
    for (const version of ['1.9', '1.10', '1.8.7']) await ok(person, createReleaseContract, { params: { code: own.slug }, body: { version } });
    const list = await ok(person, listReleasesContract, { params: { code: own.slug } });
    expect(list.items.map((release) => release.version)).toEqual(['1.8.7', '1.10', '1.9']);
  });
});

describe('PATCH /api/v1/codes/{code}/releases/{version}', () => {
  it('changes the state under the revision that was read; an older one stays current beside it', async () => {
    const at = (version: string) => ({ params: { code: code.slug, version } });
    for (const version of ['3.0', '3.1']) {
      await ok(person, createReleaseContract, { params: { code: code.slug }, body: { version } });
      const response = await send(person, updateReleaseContract, { ...at(version), body: { state: 'current' }, ...ifMatch(1) });
      expect(response.body).toMatchObject({ version, state: 'current', revision: 2 });
      expect(response.headers.etag).toBe('"2"');
    }
    expect(await ok(person, updateReleaseContract, { ...at('3.0'), body: { state: 'withdrawn' }, ...ifMatch(2) })).toMatchObject({ state: 'withdrawn', revision: 3 });
  });

  it('answers 428 without If-Match, 400 to one that is no revision, 412 to a stale one', async () => {
    await ok(person, createReleaseContract, { params: { code: code.slug }, body: { version: '4.0' } });
    const sent = { params: { code: code.slug, version: '4.0' }, body: { state: 'current' } };
    expect((await refused(person, updateReleaseContract, sent)).status).toBe(428);
    expect((await refused(person, updateReleaseContract, { ...sent, headers: { 'if-match': 'latest' } })).status).toBe(400);
    await ok(person, updateReleaseContract, { ...sent, ...ifMatch(1) });
    expect((await refused(person, updateReleaseContract, { ...sent, ...ifMatch(1) })).status).toBe(412);
  });

  it('answers 422 to a state there is not and 404 to a version there is not', async () => {
    const params = { code: code.slug, version: '4.0' };
    expect((await refused(person, updateReleaseContract, { params, body: { state: 'retired' }, ...ifMatch(2) })).status).toBe(422);
    expect((await refused(person, updateReleaseContract, { params: { ...params, version: '0.1' }, body: { state: 'current' }, ...ifMatch(1) })).status).toBe(404);
  });
});
