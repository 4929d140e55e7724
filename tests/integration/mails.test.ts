import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { listMailsContract, resendMailContract } from '@/lib/domain/mail/schema';
import { updateMailPreferencesContract } from '@/lib/domain/people/account-schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { sendMail } from '@/lib/services/mail/send-mail';
import { adminDatabase } from '../support/admin-database';
import { ok, refused } from '../support/api';
import { awaitMail, listInbox } from '../support/inbox';
import { insertWaitingMail, mailContext, openMailServer } from '../support/mailing';
import { addMember, newEmail, signUp, type Person } from '../support/people';
import { awaitOutcome } from '../support/study';
import { openSweeping } from '../support/sweeping';
import { makeWork } from '../support/work';

let owner: Person;
const { ctx, close } = openSweeping(() => new Date());
beforeAll(async () => {
  owner = await signUp('Mail Works');
});
afterAll(close);

const sendBy = (mailId: string, smtpUrl?: string) =>
  sendMail({ ...ctx, ...mailContext(smtpUrl), organisation: { id: owner.at.id } }, { organisationId: owner.at.id, mailId });
const stateOf = async (id: string) => (await ok(owner, listMailsContract, { query: { limit: 200 } })).items.find((mail) => mail.id === id);

describe('a mail', () => {
  it('sent by three workers at once comes once, under the Message-ID of its event', async () => {
    const address = newEmail();
    const id = await insertWaitingMail(owner.at.id, address);
    await Promise.all([1, 2, 3].map(() => sendBy(id)));
    await sendBy(id);
    expect((await awaitMail(address)).messageId).toBe(`<${id}.0@127.0.0.1>`);
    expect(await stateOf(id)).toMatchObject({ state: 'sent', fault: null });
  });

  it('refused for good has failed, with what the server said, and is sent again only when asked', async () => {
    const address = newEmail();
    const id = await insertWaitingMail(owner.at.id, address);
    const server = await openMailServer({ onRcptTo: (_address, _session, done) => done(Object.assign(new Error('No such mailbox'), { responseCode: 550 })) });
    await sendBy(id, server.url);
    await server.close();
    expect(await stateOf(id)).toMatchObject({ state: 'failed', fault: /No such mailbox/ });
    await ok(owner, resendMailContract, { params: { id } });
    expect((await awaitMail(address)).messageId).toBe(`<${id}.1@127.0.0.1>`);
    expect(await refused(owner, resendMailContract, { params: { id } })).toMatchObject({ status: 409 });
  });

  it('refused for now, or with nobody there, waits to be tried again', async () => {
    const id = await insertWaitingMail(owner.at.id, newEmail());
    const server = await openMailServer({ onMailFrom: (_address, _session, done) => done(Object.assign(new Error('Come back later'), { responseCode: 451 })) });
    await expect(sendBy(id, server.url)).rejects.toThrow(/Come back later/);
    await server.close();
    expect(await stateOf(id)).toMatchObject({ state: 'queued', fault: /Come back later/ });
    await expect(sendBy(id, server.url)).rejects.toThrow(/ECONNREFUSED/);
    expect(await stateOf(id)).toMatchObject({ state: 'queued' });
  });

  it('whose connection breaks while it goes out is not sent again by itself; the owner sees it and may send it again', async () => {
    const address = newEmail();
    const id = await insertWaitingMail(owner.at.id, address);
    const server = await openMailServer({ onData: (stream) => { stream.once('data', () => stream.destroy()); }, closeTimeout: 100 });
    await sendBy(id, server.url);
    await server.close();
    expect(await stateOf(id)).toMatchObject({ state: 'sending', fault: /ended while it was sent/ });
    await sendBy(id);
    expect(await listInbox(address)).toEqual([]);
    expect(await refused(owner, resendMailContract, { params: { id } })).toMatchObject({ status: 409 });
    await adminDatabase().query("update mails set claimed_at = now() - interval '3 minutes' where id = $1", [id]);
    await ok(owner, resendMailContract, { params: { id } });
    await awaitMail(address);
  });
});

describe('a study that fails', () => {
  it('is told to whoever made it, with its numbers and a link, and not to those who chose otherwise', async () => {
    const teller = await addMember(owner.at, ['engineer']);
    const silent = await addMember(owner.at, ['engineer']);
    await ok(silent, updateMailPreferencesContract, { body: { 'study-failed': false } });
    const work = await makeWork(teller);
    for (const person of [silent, teller]) {
      const grids = [8, 16, 32, 64, 128].map((n) => ({ label: `n${n}`, h: 1 / n, errors: { T: { L2: 1 / n, Linf: 2 / n } } }));
      const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids } });
      expect((await awaitOutcome(person, study.id)).outcome).toBe('fail');
      if (person === silent) continue;
      const mail = await awaitMail(person.email);
      expect(mail.subject).toBe('Fail: Heat, second order, Brack 1.0.0');
      expect(mail.text).toContain(`/${owner.at.slug}/studies/${study.id}`);
      expect(mail.text).toMatch(/Fails in: +L2 of T; L∞ of T/);
      expect(mail.source).toMatch(/^List-Unsubscribe: </m);
    }
    expect(await listInbox(silent.email)).toEqual([]);
  });
});
