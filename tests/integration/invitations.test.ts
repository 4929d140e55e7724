import { beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract } from '@/lib/domain/codes/schema';
import {
  acceptInvitationContract, createInvitationContract, listInvitationsContract, lookUpInvitationContract, resendInvitationContract, revokeInvitationContract,
} from '@/lib/domain/invitations/schema';
import { listMembersContract } from '@/lib/domain/members/schema';
import { meContract, type Me } from '@/lib/domain/people/schema';
import { adminDatabase } from '../support/admin-database';
import { ok, refused, send } from '../support/api';
import { awaitMail, tokenIn } from '../support/inbox';
import { addMember, cookieOf, newEmail, password, signUp, type Person } from '../support/people';

const nextYear = `${new Date().getUTCFullYear() + 1}-06-01T00:00:00.000Z`;
let owner: Person;

beforeAll(async () => {
  owner = await signUp('Inviting Works');
});

async function invite(roles: ('engineer' | 'reviewer' | 'owner' | 'auditor')[] = ['engineer'], more: { codes?: string[]; until?: string } = {}) {
  const email = newEmail('guest');
  const invitation = await ok(owner, createInvitationContract, { body: { email, roles, ...more } });
  return { email, invitation, token: tokenIn(await awaitMail(email)) };
}

describe('POST /api/v1/invitations', () => {
  it('sends a mail in text and HTML with a link straight to the invitation, and keeps only the hash of its token', async () => {
    const { email, invitation, token } = await invite(['engineer', 'reviewer']);
    const mail = await awaitMail(email);
    expect(mail.subject).toBe('Invitation to Inviting Works on Fourfold');
    expect(mail.text).toContain(`${owner.email} invites you to Inviting Works as engineer and reviewer.`);
    expect(mail.html).toContain('Accept the invitation');
    expect(mail.messageId).toMatch(/^<[0-9a-f-]{36}\.0@127\.0\.0\.1>$/);
    expect(mail.source).toMatch(/^Auto-Submitted: auto-generated\r?$/m);
    expect(invitation).toMatchObject({ email, roles: ['engineer', 'reviewer'], state: 'pending', invitedBy: owner.email, until: null, codes: null });
    const { rows } = await adminDatabase().query("select token_sha256 = sha256($2::bytea) as matches from invitations where id = $1", [invitation.id, token]);
    expect(rows).toEqual([{ matches: true }]);
    const { rows: kept } = await adminDatabase().query('select facts::text from mails where subject_id = $1', [invitation.id]);
    expect(JSON.stringify(kept)).not.toContain(token);
  });

  it('answers 422 at the field for roles that do not go together, an auditor without end, and an end that is past', async () => {
    const body = { email: newEmail(), roles: ['auditor', 'engineer'] };
    expect(await refused(owner, createInvitationContract, { body })).toMatchObject({ status: 422, errors: [{ path: 'roles' }] });
    expect(await refused(owner, createInvitationContract, { body: { ...body, roles: ['auditor'] } })).toMatchObject({ status: 422, errors: [{ path: 'until' }] });
    const past = { ...body, roles: ['auditor'], until: '2020-01-01T00:00:00Z' };
    expect(await refused(owner, createInvitationContract, { body: past })).toMatchObject({ status: 422, errors: [{ path: 'until' }] });
    expect(await refused(owner, createInvitationContract, { body: { ...body, roles: ['engineer'], codes: ['brack'] } })).toMatchObject({ errors: [{ path: 'codes' }] });
  });

  it('answers 422 for a code that is not there, also where another organisation has it', async () => {
    const stranger = await signUp('Stranger Works');
    const code = await ok(stranger, createCodeContract, { body: { name: 'Far' } });
    const problem = await refused(owner, createInvitationContract, { body: { email: newEmail(), roles: ['auditor'], until: nextYear, codes: [code.id] } });
    expect(problem).toMatchObject({ status: 422, errors: [{ path: 'codes.0' }] });
  });

  it('answers 409 for a member, for oneself, and for an address that is invited already', async () => {
    const member = await addMember(owner.at, ['engineer']);
    for (const email of [member.email, owner.email]) {
      expect(await refused(owner, createInvitationContract, { body: { email, roles: ['engineer'] } })).toMatchObject({ status: 409, errors: [{ path: 'email' }] });
    }
    const { email } = await invite();
    expect(await refused(owner, createInvitationContract, { body: { email, roles: ['engineer'] } })).toMatchObject({ status: 409, errors: [{ path: 'email' }] });
  });
});

describe('POST /api/v1/invitations/accept', () => {
  it('makes an account with the password chosen, a member with the roles given, and a session', async () => {
    const { email, token } = await invite(['reviewer']);
    expect(await ok(null, lookUpInvitationContract, { body: { token } })).toMatchObject({ organisation: 'Inviting Works', email, hasAccount: false, state: 'pending' });
    expect(await refused(null, acceptInvitationContract, { body: { token } })).toMatchObject({ status: 422, errors: [{ path: 'password' }] });
    const response = await send(null, acceptInvitationContract, { body: { token, password } });
    expect(response.status).toBe(200);
    expect((response.body as Me).organisations).toEqual([{ ...owner.at, roles: ['reviewer'] }]);
    expect(await ok({ cookie: cookieOf(response) }, meContract, {})).toMatchObject({ email });
    expect(await refused(null, acceptInvitationContract, { body: { token, password } })).toMatchObject({ status: 409 });
  });

  it('lets somebody who has an account in by its password, or as they are signed in, and nobody else', async () => {
    const guest = await signUp('Guest Works');
    const other = await signUp('Other Works');
    const { id } = await ok(owner, createInvitationContract, { body: { email: guest.email, roles: ['engineer'] } });
    const token = tokenIn(await awaitMail(guest.email));
    expect((await ok(null, lookUpInvitationContract, { body: { token } })).hasAccount).toBe(true);
    expect(await refused(other, acceptInvitationContract, { body: { token } })).toMatchObject({ status: 409 });
    expect(await refused(null, acceptInvitationContract, { body: { token, password: 'not this password' } })).toMatchObject({ status: 401 });
    const me = await ok(guest, acceptInvitationContract, { body: { token } });
    expect(me.organisations.map(({ slug }) => slug)).toEqual([guest.at.slug, owner.at.slug]);
    const { items } = await ok(owner, listInvitationsContract, {});
    expect(items.find((item) => item.id === id)).toMatchObject({ state: 'accepted', mail: { state: 'sent' } });
  });

  it('accepted twice at the same moment makes one member', async () => {
    const { email, token } = await invite();
    const answers = await Promise.all([1, 2, 3].map(() => send(null, acceptInvitationContract, { body: { token, password } })));
    expect(answers.map(({ status }) => status).filter((status) => status === 200)).toHaveLength(1);
    const { items } = await ok(owner, listMembersContract, { query: { limit: 200 } });
    expect(items.filter((member) => member.email === email)).toHaveLength(1);
  });

  it('gives an auditor the codes and the end, after which there is nothing any more', async () => {
    const code = await ok(owner, createCodeContract, { body: { name: 'Audited' } });
    const { email, token } = await invite(['auditor'], { codes: [code.slug], until: nextYear });
    const guest = { cookie: cookieOf(await send(null, acceptInvitationContract, { body: { token, password } })) };
    expect((await ok(guest, meContract, {})).organisations).toMatchObject([{ roles: ['auditor'] }]);
    const { items } = await ok(owner, listMembersContract, { query: { limit: 200 } });
    expect(items.find((member) => member.email === email)).toMatchObject({ roles: ['auditor'], codes: [code.slug], until: nextYear });
    await adminDatabase().query("update memberships set until = now() - interval '1 second' where user_id = (select id from users where email = $1)", [email]);
    expect((await ok(guest, meContract, {})).organisations).toEqual([]);
    expect(await refused({ ...guest, organisation: owner.at.slug }, listMembersContract, {})).toMatchObject({ status: 404 });
  });

  it('answers 404 for a token that nobody made', async () => {
    expect(await refused(null, acceptInvitationContract, { body: { token: 'none', password } })).toMatchObject({ status: 404 });
  });
});

describe('POST /api/v1/invitations/{id}/resend', () => {
  it('sends a new link, voids the one before, and revives an invitation that had expired', async () => {
    const { email, invitation, token } = await invite();
    await adminDatabase().query("update invitations set expires_at = now() - interval '1 second' where id = $1", [invitation.id]);
    expect(await ok(null, lookUpInvitationContract, { body: { token } })).toMatchObject({ state: 'expired' });
    expect(await refused(null, acceptInvitationContract, { body: { token, password } })).toMatchObject({ status: 409, detail: /expired/ });
    expect(await ok(owner, resendInvitationContract, { params: { id: invitation.id } })).toMatchObject({ state: 'pending' });
    const second = tokenIn(await awaitMail(email, 2));
    expect(second).not.toBe(token);
    expect(await refused(null, acceptInvitationContract, { body: { token, password } })).toMatchObject({ status: 404 });
    await ok(null, acceptInvitationContract, { body: { token: second, password } });
    expect(await refused(owner, resendInvitationContract, { params: { id: invitation.id } })).toMatchObject({ status: 409 });
  });
});

describe('DELETE /api/v1/invitations/{id}', () => {
  it('voids the link, and makes room for another invitation', async () => {
    const { email, invitation, token } = await invite();
    await ok(owner, revokeInvitationContract, { params: { id: invitation.id } });
    expect(await refused(null, acceptInvitationContract, { body: { token, password } })).toMatchObject({ status: 409, detail: /revoked/ });
    expect(await refused(owner, revokeInvitationContract, { params: { id: invitation.id } })).toMatchObject({ status: 409 });
    await ok(owner, createInvitationContract, { body: { email, roles: ['engineer'] } });
  });
});
