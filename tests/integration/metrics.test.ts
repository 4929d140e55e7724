import { setTimeout as pause } from 'node:timers/promises';
import { beforeAll, describe, expect, it } from 'vitest';
import { metricsContract } from '@/lib/domain/api/service-schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { putDataContract } from '@/lib/domain/uploads/schema';
import { ok, refused } from '../support/api';
import { need } from '../support/environment';
import { heatSizes, heatTable } from '../support/grids';
import { parseMetrics, sumOf, type Sample } from '../support/metrics-text';
import { signUp } from '../support/people';
import { awaitOutcome, putFile } from '../support/study';
import { makeWork } from '../support/work';

async function read(url: string): Promise<Sample[]> {
  const response = await fetch(url);
  expect(response.status).toBe(200);
  expect(response.headers.get('content-type')).toContain('text/plain; version=0.0.4');
  return parseMetrics(await response.text());
}

const web = () => read(`${need('WEB_URL')}/api/v1/metrics`);
const worker = () => read(`http://127.0.0.1:${need('METRICS_PORT')}/metrics`);
let before: { web: Sample[]; worker: Sample[] };
let after: { web: Sample[]; worker: Sample[] };
let bytes = 0;

beforeAll(async () => {
  const engineer = await signUp('Metrics');
  const work = await makeWork(engineer);
  before = { web: await web(), worker: await worker() };
  const study = await ok(engineer, createStudyContract, {
    body: { case: work.case.slug, release: '1.0.0', grids: heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
  });
  for (const n of heatSizes) {
    bytes += heatTable(n).length;
    await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
  }
  await awaitOutcome(engineer, study.id);
  await refused(engineer, createStudyContract, { body: { case: 'none', release: '1.0.0', grids: [{ label: 'a', h: 1 }] } });
  // A job counts once its outbox row is done, a moment after the outcome is there.
  await pause(500);
  after = { web: await web(), worker: await worker() };
});

const grown = (process: 'web' | 'worker', name: string, labels: Record<string, string> = {}) => sumOf(after[process], name, labels) - sumOf(before[process], name, labels);

describe('GET /api/v1/metrics', () => {
  it('counts requests by route and status, their time and their bytes', () => {
    const route = '/studies/{id}/grids/{label}/data';
    expect(grown('web', 'fourfold_http_requests_total', { method: 'PUT', route, status: String(putDataContract.status) })).toBe(4);
    expect(grown('web', 'fourfold_http_request_seconds_count', { route })).toBe(4);
    expect(grown('web', 'fourfold_http_received_bytes_total', { route })).toBe(bytes);
    expect(grown('web', 'fourfold_http_sent_bytes_total', { route })).toBeGreaterThan(400);
  });

  it('counts refusals by their code', () => expect(grown('web', 'fourfold_errors_total', { code: 'not-found' })).toBe(1));

  it('tells what waits in the queue, the outbox and on the way, and the state of the process', () => {
    for (const job of ['grid.read', 'study.assess', 'mail.send']) {
      for (const state of ['waiting', 'queued', 'failed']) expect(sumOf(after.web, 'fourfold_outbox_jobs', { job, state })).toBeGreaterThanOrEqual(0);
      expect(sumOf(after.web, 'fourfold_outbox_oldest_seconds', { job })).toBeGreaterThanOrEqual(0);
    }
    for (const state of ['wait', 'active', 'delayed']) expect(sumOf(after.web, 'fourfold_queue_jobs', { state })).toBeGreaterThanOrEqual(0);
    for (const state of ['queued', 'sending', 'failed']) expect(after.web.some(({ name, labels }) => name === 'fourfold_mails' && labels.state === state)).toBe(true);
    expect(sumOf(after.web, 'fourfold_uploads_open')).toBeGreaterThanOrEqual(0);
    expect(sumOf(after.web, 'fourfold_database_connections', { state: 'open' })).toBeGreaterThan(0);
    expect(sumOf(after.web, 'process_resident_memory_bytes')).toBeGreaterThan(1e7);
    expect(sumOf(after.web, 'process_cpu_seconds_total')).toBeGreaterThan(0);
  });

  it('is not there for callers whom a proxy speaks for, or from elsewhere', async () => {
    for (const [name, value] of [['x-forwarded-for', '203.0.113.9'], ['via', '1.1 proxy'], ['x-real-ip', '203.0.113.9']] as const) {
      expect((await refused(null, metricsContract, { headers: { [name]: value } })).status).toBe(404);
    }
  });
});

describe('the metrics of the worker', () => {
  it('count files, rows and bytes read, and jobs by their end', () => {
    expect(grown('worker', 'fourfold_files_read_total')).toBe(4);
    expect(grown('worker', 'fourfold_rows_read_total')).toBe(heatSizes.reduce((sum, n) => sum + n * n, 0));
    expect(grown('worker', 'fourfold_bytes_read_total')).toBe(bytes);
    expect(grown('worker', 'fourfold_jobs_total', { job: 'grid.read', outcome: 'done' })).toBe(4);
    expect(grown('worker', 'fourfold_jobs_total', { job: 'study.assess', outcome: 'done' })).toBe(1);
    expect(grown('worker', 'fourfold_job_seconds_count', { job: 'grid.read' })).toBe(4);
  });

  it('are served at one path only', async () => expect((await fetch(`http://127.0.0.1:${need('METRICS_PORT')}/`)).status).toBe(404));
});
