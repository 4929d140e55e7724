import http from 'node:http';
import { Redis } from 'ioredis';
import { beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract, getEventsContract, getOutcomeContract, getOutcomeXmlContract, type Study } from '@/lib/domain/studies/schema';
import { addressOf, headersOf, ok, refused, send } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { listen } from '@/tests/support/event-reader';
import { heatSizes, heatTable } from '@/tests/support/grids';
import { makeToken, signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';
import { checkWellFormed } from '@/tests/support/xml';

let engineer: Person;
let work: Work;
/** Second order in L2, first in L∞ where asked for. */
const typed = (sizes: number[], order = 2) => sizes.map((n) => ({
  label: `n${n}`, cellsPerDirection: n, errors: { T: { L2: 0.3 / n ** 2, Linf: 0.5 / n ** order } },
}));

beforeAll(async () => {
  engineer = await signUp('Outcomes & events');
  work = await makeWork(engineer);
});

function make(grids: object[]): Promise<Study> {
  return ok(engineer, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids } });
}

describe('GET /api/v1/studies/{id}/outcome', () => {
  it('answers 202 with the state until there is one, and waits as long as asked', async () => {
    const study = await make(heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })));
    const pending = await send(engineer, getOutcomeContract, { params: { id: study.id } });
    expect([pending.status, pending.body]).toEqual([202, { state: 'collecting' }]);
    const waiting = send(engineer, getOutcomeContract, { params: { id: study.id }, query: { wait: 60 } });
    for (const n of heatSizes) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    const answer = await waiting;
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ study: study.id, revision: 1, release: '1.0.0', case: work.case.slug, code: work.code.slug, outcome: 'pass' });
  });

  it('is XML for a pipeline that asks for it, with the numbers in the message', async () => {
    const study = await make(typed(heatSizes, 1));
    await awaitOutcome(engineer, study.id);
    const token = await makeToken(engineer, { scopes: ['read'] });
    const answer = await send(token, getOutcomeContract, { params: { id: study.id }, headers: { accept: 'application/xml' } });
    expect(answer.type).toBe('application/xml');
    checkWellFormed(answer.text);
    expect(answer.text).toContain('<testsuites name="fourfold" tests="2" failures="1" errors="0" skipped="0">');
    expect(answer.text).toMatch(/<testcase classname="brack\.1\.0\.0\.[^"]+" name="T Linf">\s+<failure type="fail" message="[^"]*1\.00/);
    expect(answer.text).toMatch(/name="T L2"\/>/);
  });

  it('counts inconclusive as a failure of its own, or as skipped', async () => {
    const study = await make(typed([8, 16, 32]));
    await awaitOutcome(engineer, study.id);
    const failing = await send(engineer, getOutcomeXmlContract, { params: { id: study.id } });
    checkWellFormed(failing.text);
    expect(failing.text).toContain('failures="2"');
    expect(failing.text).toContain('<failure type="inconclusive"');
    const skipping = await send(engineer, getOutcomeXmlContract, { params: { id: study.id }, query: { inconclusive: 'skip' } });
    expect(skipping.text).toContain('failures="0" errors="0" skipped="2"');
    expect((await refused(engineer, getOutcomeXmlContract, { params: { id: study.id }, query: { inconclusive: 'pass' } })).status).toBe(422);
  });
});

describe('GET /api/v1/studies/{id}/events', () => {
  it('tells how the study stands, then what happens to it, without asking again', async () => {
    const study = await make(heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })));
    const events = await listen(engineer, study.id);
    expect(events.type).toContain('text/event-stream');
    const [first] = await events.until(({ event }) => event === 'snapshot');
    expect(first?.data).toMatchObject({ state: 'collecting', revision: 1 });
    expect(first?.data.grids).toHaveLength(4);
    for (const n of heatSizes) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    const heard = await events.until(({ event, data }) => event === 'state' && data.state === 'assessed');
    events.stop();
    for (const n of heatSizes) {
      const own = heard.filter(({ event, data }) => event === 'state' && data.grid === `n${n}`).map(({ data }) => data.gridState);
      expect(own).toEqual(expect.arrayContaining(['stored', 'reading', 'read']));
    }
    expect(heard.find(({ event }) => event === 'progress')?.data).toMatchObject({ bytes: expect.any(Number) as number, rowsRead: expect.any(Number) as number });
    const late = await listen(engineer, study.id);
    expect((await late.until(({ event }) => event === 'snapshot'))[0]?.data).toMatchObject({ state: 'assessed' });
    late.stop();
  });

  it('ends the listening of those who leave, also while it begins', async () => {
    const study = await make([{ label: 'n8', cellsPerDirection: 8 }]);
    const url = new URL(addressOf(getEventsContract, { params: { id: study.id } }, engineer), need('WEB_URL'));
    await Promise.all(Array.from({ length: 60 }, (_, index) => new Promise<void>((resolve) => {
      const request = http.get(url, { headers: headersOf(getEventsContract, engineer), agent: false });
      request.on('error', () => undefined).on('close', resolve);
      setTimeout(() => request.destroy(), index);
    })));
    const redis = new Redis(need('REDIS_URL'));
    try {
      await expect.poll(() => redis.pubsub('NUMSUB', `study-events.${study.id}`), { timeout: 10_000 }).toEqual([`study-events.${study.id}`, 0]);
    } finally {
      redis.disconnect();
    }
  });

  it('hears of a study whose id is written in capitals', async () => {
    const study = await make([{ label: 'n8', cellsPerDirection: 8 }]);
    const events = await listen(engineer, study.id.toUpperCase());
    await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(8));
    await events.until(({ event, data }) => event === 'state' && data.gridState === 'read');
    events.stop();
  });

  it('is not there for another organisation', async () => {
    const study = await make(typed(heatSizes));
    const stranger = await signUp('Strangers');
    expect((await refused(stranger, getEventsContract, { params: { id: study.id } })).status).toBe(404);
  });
});
