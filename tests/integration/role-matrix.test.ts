import { beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract } from '@/lib/domain/codes/schema';
import { addressOf, headersOf, ok, type Who } from '../support/api';
import { checkAgainstDocument } from '../support/document-check';
import { need } from '../support/environment';
import { addMember, makeToken, signUp, type Person } from '../support/people';
import { listRouteCalls } from '../support/route-files';
import { layGround, roleRows, type Ground, type RoleRow } from './role-rows';

let ground: Ground;
let stranger: Person;
let owner: Person;
let reviewer: Person;
let auditor: Person;
let engineer: Person;
let readToken: Who;
let otherCodeToken: Who;

beforeAll(async () => {
  ground = await layGround();
  stranger = await signUp('Stranger Works');
  const { at } = ground.person;
  owner = await addMember(at, ['owner']);
  reviewer = await addMember(at, ['reviewer']);
  auditor = await addMember(at, ['auditor']);
  engineer = await addMember(at, ['engineer']);
  const other = await ok(ground.person, createCodeContract, { body: { name: 'Other code' } });
  readToken = await makeToken(ground.person, { scopes: ['read'] });
  otherCodeToken = await makeToken(ground.person, { scopes: ['read', 'write'], code: other.slug });
});

/** The status alone: a stream of events would not end by itself. Refusals are checked against the document. */
async function statusOf(who: Who, { contract, sent }: RoleRow): Promise<number> {
  const { body, headers, ...rest } = sent(ground);
  const patience = new AbortController();
  const response = await fetch(`${need('WEB_URL')}${addressOf(contract, rest, who)}`, {
    method: contract.method, signal: patience.signal,
    headers: { 'content-type': 'application/json', ...headersOf(contract, who), ...headers },
    body: body === undefined ? undefined : typeof body === 'string' ? body : JSON.stringify(body),
  });
  if (response.status >= 400) await checkAgainstDocument(contract, response.status, response.headers.get('content-type') ?? '', await response.json());
  patience.abort();
  return response.status;
}

const isLetThrough = (status: number) => ![401, 403, 404].includes(status) && status < 500;
const named = (rows: RoleRow[]) => rows.map((row) => [`${row.contract.method} /api/v1${row.contract.path}`, row] as const);
const organisationRows = named(roleRows.filter((row) => row.contract.access === 'organisation'));
const rowsThat = (...needs: RoleRow['needs'][]) => organisationRows.filter(([, row]) => needs.includes(row.needs));

it('every route has its row, and every row its route', () => {
  const rows = roleRows.map(({ contract }) => `${contract.method} ${contract.path}`);
  expect(new Set(rows).size).toBe(rows.length);
  expect(rows.sort()).toEqual(listRouteCalls());
});

describe('without a session', () => {
  it.each(named(roleRows.filter((row) => row.contract.access !== 'public')))('%s answers 401', async (_name, row) => {
    expect(await statusOf(null, row)).toBe(401);
    expect(await statusOf({ token: 'fft_unknown' }, row)).toBe(401);
  });
});

describe('from another organisation', () => {
  it.each(organisationRows)('%s answers 404 under the name of the organisation', async (_name, row) => {
    expect(await statusOf({ ...stranger, organisation: ground.person.at.slug }, row)).toBe(404);
  });
  it.each(organisationRows.filter(([, row]) => row.contract.path.includes('{')))('%s answers 404 under its own name', async (_name, row) => {
    expect(await statusOf(stranger, row)).toBe(404);
  });
});

describe('an auditor', () => {
  it.each(organisationRows)('%s answers 404', async (_name, row) => expect(await statusOf(auditor, row)).toBe(404));
});

describe('who may only read', () => {
  it.each(rowsThat('write'))('%s answers 403 to a reviewer, an owner and a token that reads', async (_name, row) => {
    for (const who of [reviewer, owner, readToken]) expect(await statusOf(who, row)).toBe(403);
  });
  it.each(rowsThat('tokens'))('%s answers 403 to a reviewer and to a token', async (_name, row) => {
    for (const who of [reviewer, readToken]) expect(await statusOf(who, row)).toBe(403);
  });
});

describe('who may not touch people', () => {
  it.each(rowsThat('people'))('%s answers 403 to an engineer, a reviewer and a token', async (_name, row) => {
    for (const who of [engineer, reviewer, readToken]) expect(await statusOf(who, row)).toBe(403);
  });
  it.each(rowsThat('members'))('%s answers 403 to a token', async (_name, row) => expect(await statusOf(readToken, row)).toBe(403));
});

describe('a token limited to another code', () => {
  it.each(rowsThat('read', 'write'))('%s shows and changes nothing of this one', async (_name, row) => {
    const status = await statusOf(otherCodeToken, row);
    if (row.otherCode === 'answer') expect(status).toBe(200);
    else expect(status).toBe(row.otherCode);
  });
});

/** Allowed calls may still be refused for what they ask, never for who asks. */
const mayLackTheThing = ['GET /api/v1/studies/{id}/grids/{label}/maps/{field}', 'GET /api/v1/studies/{id}/grids/{label}/result', 'GET /api/v1/uploads/{id}/preview'];

describe('who may', () => {
  it.each(rowsThat('read'))('%s answers every role that reads', async (name, row) => {
    for (const who of [engineer, owner, reviewer, readToken]) {
      const status = await statusOf(who, row);
      expect(isLetThrough(status) || (status === 404 && mayLackTheThing.includes(name)), `${status}`).toBe(true);
    }
  });
  it.each(rowsThat('write'))('%s lets an engineer through', async (_name, row) => {
    const status = await statusOf(engineer, row);
    expect(isLetThrough(status), `${status}`).toBe(true);
  });
  it.each(rowsThat('people'))('%s lets an owner through', async (_name, row) => {
    const status = await statusOf(owner, row);
    expect(isLetThrough(status), `${status}`).toBe(true);
  });
  it.each(rowsThat('members'))('%s answers every member who reads', async (_name, row) => {
    for (const who of [engineer, owner, reviewer]) expect(isLetThrough(await statusOf(who, row))).toBe(true);
  });
  it.each(rowsThat('tokens'))('%s lets engineers and owners through to their own', async (_name, row) => {
    const isOnOne = row.contract.path.includes('{id}');
    expect(isLetThrough(await statusOf(ground.person, row))).toBe(true);
    const status = await statusOf(owner, row);
    expect(isOnOne ? status === 404 : isLetThrough(status)).toBe(true);
  });
});
