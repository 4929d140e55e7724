import fs from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { beforeAll, describe, expect, it } from 'vitest';
import { healthContract } from '@/lib/domain/api/service-schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok, send } from '../support/api';
import { need } from '../support/environment';
import { heatTable } from '../support/grids';
import { signUp, type Person } from '../support/people';
import { awaitStudy, putFile } from '../support/study';
import { makeWork } from '../support/work';

type Line = Record<string, unknown>;

function linesOf(process: string): Line[] {
  const text = fs.readFileSync(path.join(need('TEST_LOG_FOLDER'), `${process}.log`), 'utf8');
  return text.split('\n').filter((line) => line.startsWith('{')).map((line) => JSON.parse(line) as Line);
}

/** Lines about a request, once at least so many are written. */
async function linesAbout(process: string, requestId: string, count: number): Promise<Line[]> {
  for (let tries = 0; ; tries += 1) {
    const found = linesOf(process).filter((line) => line.requestId === requestId);
    if (found.length >= count || tries === 50) return found;
    await pause(100);
  }
}

const idOf = (response: { headers: unknown }) => (response.headers as Record<string, string>)['x-request-id'] ?? '';
let engineer: Person;

beforeAll(async () => { engineer = await signUp('Request ids'); });

describe('the id of a request', () => {
  it('is the one that was sent, where it is well formed', async () => {
    expect(idOf(await send(null, healthContract, { headers: { 'x-request-id': 'pipeline-17.4' } }))).toBe('pipeline-17.4');
  });

  it.each(['', 'a b', 'x'.repeat(65), '{"level":60}'])('is a new one in place of "%s"', async (sent) => {
    expect(idOf(await send(null, healthContract, { headers: { 'x-request-id': sent } }))).toMatch(/^[0-9a-f-]{36}$/);
  });

  it('stands in one line with who asked, for what, and how it went', async () => {
    const response = await send(engineer, createStudyContract, { body: { case: 'none', release: '1', grids: [{ label: 'a', h: 1 }] } });
    expect(response.status).toBe(404);
    const lines = await linesAbout('web', idOf(response), 1);
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatchObject({
      msg: 'request', method: 'POST', route: '/studies', path: '/api/v1/studies', status: 404, error: 'not-found', user: engineer.userId, organisation: engineer.at.id,
    });
    expect(lines[0]?.milliseconds).toBeGreaterThan(0);
    expect(lines[0]?.received).toBeGreaterThan(10);
    expect(lines[0]?.sent).toBeGreaterThan(100);
  });

  it('goes on to the jobs that follow from it, and from them', async () => {
    const work = await makeWork(engineer);
    const study = await ok(engineer, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: [8, 16, 32].map((n) => ({ label: `n${n}`, h: 1 / n })) } });
    const ids = { n8: 'first-file', n16: 'second-file', n32: `last-${study.id}` };
    for (const [label, id] of Object.entries(ids)) {
      await putFile(engineer, { id: study.id, label }, heatTable(Number(label.slice(1))), { 'x-request-id': id });
      await awaitStudy(engineer, study.id, ({ grids }) => grids.every((grid) => grid.label !== label || grid.state === 'read'));
    }
    const lines = await linesAbout('worker', ids.n32, 2);
    expect(lines.map(({ msg, job }) => [msg, job])).toEqual([['job done', 'grid.read'], ['job done', 'study.assess']]);
    for (const { jobId, subject, organisation } of lines) {
      expect(jobId).toMatch(/^[0-9a-f-]{36}-1$/);
      expect(subject).toMatch(/^[0-9a-f-]{36}$/);
      expect(organisation).toBe(engineer.at.id);
    }
  });
});
