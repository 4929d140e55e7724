import { beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract, listCodesContract } from '@/lib/domain/codes/schema';
import { listMembersContract, removeMemberContract, updateMemberContract } from '@/lib/domain/members/schema';
import { getOrganisationContract, updateOrganisationContract } from '@/lib/domain/organisation/schema';
import { createOrganisationContract, meContract } from '@/lib/domain/people/schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ifMatch, ok, refused, send } from '../support/api';
import { listen } from '../support/event-reader';
import { awaitMail } from '../support/inbox';
import { addMember, makeToken, signUp, type Person } from '../support/people';
import { makeWork } from '../support/work';

let owner: Person;
beforeAll(async () => {
  owner = await signUp('Member Works');
});

describe('GET /api/v1/members', () => {
  it('lists members page by page, those who came last first', async () => {
    const works = await signUp('Listed Works');
    const reviewer = await addMember(works.at, ['reviewer']);
    const page = await ok(works, listMembersContract, { query: { limit: 1 } });
    expect(page.items).toMatchObject([{ id: reviewer.userId, email: reviewer.email, roles: ['reviewer'], codes: null, until: null }]);
    const rest = await ok(reviewer, listMembersContract, { query: { limit: 1, cursor: page.nextCursor ?? '' } });
    expect(rest).toMatchObject({ items: [{ email: works.email, roles: ['owner', 'engineer'] }], nextCursor: null });
  });
});

describe('PATCH /api/v1/members/{id}', () => {
  it('changes roles at once, for tokens too, and tells the member by mail', async () => {
    const engineer = await addMember(owner.at, ['engineer']);
    const token = await makeToken(engineer, { scopes: ['read', 'write'] });
    await ok(token, createCodeContract, { body: { name: 'Before' } });
    await ok(owner, updateMemberContract, { params: { id: engineer.userId }, body: { roles: ['reviewer'] } });
    expect(await refused(token, createCodeContract, { body: { name: 'After' } })).toMatchObject({ status: 403 });
    expect((await awaitMail(engineer.email)).text).toContain(`${owner.email} changed what you may do in Member Works: you are reviewer now.`);
  });

  it('lets nobody make themselves reviewer, and keeps the last owner', async () => {
    const works = await signUp('Lone Works');
    const self = { params: { id: works.userId } };
    expect(await refused(works, updateMemberContract, { ...self, body: { roles: ['owner', 'engineer', 'reviewer'] } })).toMatchObject({ status: 403, errors: [{ path: 'roles' }] });
    expect(await refused(works, updateMemberContract, { ...self, body: { roles: ['engineer'] } })).toMatchObject({ status: 409, detail: /only owner/ });
    expect(await refused(works, removeMemberContract, self)).toMatchObject({ status: 409, detail: /only owner/ });
    await ok(works, updateMemberContract, { ...self, body: { roles: ['owner'] } });
  });

  it('leaves an owner where two owners step down, or remove each other, at the same moment', async () => {
    for (let round = 0; round < 5; round += 1) {
      const first = await signUp('Race Works');
      const second = await addMember(first.at, ['owner']);
      const calls = round % 2 === 0
        ? [first, second].map((who) => send(who, updateMemberContract, { params: { id: who.userId }, body: { roles: ['engineer'] } }))
        : [send(first, removeMemberContract, { params: { id: second.userId } }), send(second, removeMemberContract, { params: { id: first.userId } })];
      const statuses = (await Promise.all(calls)).map(({ status }) => status);
      expect(statuses.filter((status) => status < 300), `${statuses.join()}`).toHaveLength(1);
    }
  });
});

describe('DELETE /api/v1/members/{id}', () => {
  it('ends access, tokens and open event streams at once, tells by mail, and keeps the name', async () => {
    const engineer = await addMember(owner.at, ['engineer']);
    const work = await makeWork(engineer);
    const study = await ok(engineer, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids: [{ label: 'n8', h: 0.125 }] } });
    const token = await makeToken(engineer, { scopes: ['read'] });
    const events = await listen(engineer, study.id);
    await ok(owner, removeMemberContract, { params: { id: engineer.userId } });
    await events.ended(5);
    expect((await ok(engineer, meContract, {})).organisations).toEqual([]);
    expect(await refused(token, listCodesContract, {})).toMatchObject({ status: 401 });
    expect(await refused({ cookie: engineer.cookie, organisation: owner.at.slug }, listCodesContract, {})).toMatchObject({ status: 404 });
    expect((await awaitMail(engineer.email)).subject).toBe('Your access to Member Works has ended');
  });

  it('lets anybody leave, an auditor too', async () => {
    for (const role of ['engineer', 'auditor'] as const) {
      const person = await addMember(owner.at, [role]);
      await ok(person, removeMemberContract, { params: { id: person.userId } });
      expect((await ok(person, meContract, {})).organisations).toEqual([]);
    }
  });
});

describe('PATCH /api/v1/organisation', () => {
  it('renames it under the revision that was read', async () => {
    const works = await signUp('Old Works');
    const { revision } = await ok(works, getOrganisationContract, {});
    expect(await ok(works, updateOrganisationContract, { body: { name: 'New Works' }, ...ifMatch(revision) })).toMatchObject({ name: 'New Works', slug: works.at.slug, revision: revision + 1 });
    expect(await refused(works, updateOrganisationContract, { body: { name: 'Late' }, ...ifMatch(revision) })).toMatchObject({ status: 412 });
    expect(await refused(works, updateOrganisationContract, { body: { name: 'Blind' } })).toMatchObject({ status: 428 });
  });
});

describe('POST /api/v1/organisations', () => {
  it('makes another organisation of the same person, apart from the first', async () => {
    const person = await signUp('First Works');
    const token = await makeToken(person, { scopes: ['read', 'write'] });
    expect(await refused(token, createOrganisationContract, { body: { name: 'By a token' } })).toMatchObject({ status: 403 });
    const second = await ok(person, createOrganisationContract, { body: { name: 'Second Works' } });
    expect(second).toMatchObject({ name: 'Second Works', roles: ['owner', 'engineer'] });
    const within = (organisation: string) => ({ cookie: person.cookie, organisation });
    await ok(within(second.slug), createCodeContract, { body: { name: 'Only here' } });
    expect((await ok(within(person.at.slug), listCodesContract, {})).items).toEqual([]);
    expect(await refused(person, listCodesContract, {})).toMatchObject({ status: 400 });
  });
});
