import { createHash } from 'node:crypto';
import http from 'node:http';
import { gzipSync } from 'node:zlib';
import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createProblemContract } from '@/lib/domain/problems/schema';
import { createStudyContract, getGridResultContract, getOutcomeContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';
import {
  completeUploadContract, deleteUploadContract, getUploadContract, putDataContract, signPartsContract, startUploadContract,
} from '@/lib/domain/uploads/schema';
import { readEnv } from '@/lib/env';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { adminDatabase } from '@/tests/support/admin-database';
import { addressOf, headersOf, ok, refused, send } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { heatSizes, heatTable } from '@/tests/support/grids';
import { addMember, signUp, type Person } from '@/tests/support/people';
import { readBrokenFiles, readSolverFile } from '@/tests/support/solver-set';
import { awaitOutcome, awaitStudy, putFile, sendParts } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
const binary = { 'content-type': 'application/octet-stream' };
const digestOf = (bytes: Buffer) => `sha-256=:${createHash('sha256').update(bytes).digest('base64')}:`;
const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');

beforeAll(async () => {
  engineer = await signUp('Uploads');
  work = await makeWork(engineer);
});

function make(sizes = heatSizes): Promise<Study> {
  return ok(engineer, createStudyContract, {
    body: { case: work.case.slug, release: '1.0.0', grids: sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
  });
}

const settled = (study: Study) => study.grids.every(({ state }) => !['stored', 'reading'].includes(state));

describe('PUT /api/v1/studies/{id}/grids/{label}/data', () => {
  it('takes files, plain and compressed, checks their digest and gives the outcome', async () => {
    const study = await make();
    for (const n of heatSizes) {
      const bytes = n === 64 ? gzipSync(heatTable(n)) : heatTable(n);
      const upload = await putFile(engineer, { id: study.id, label: `n${n}` }, bytes, { 'repr-digest': digestOf(bytes) });
      expect(upload).toMatchObject({ grid: `n${n}`, study: study.id, bytes: bytes.length, sha256: sha256(bytes), partSize: null });
    }
    const { outcome, assessment } = await awaitOutcome(engineer, study.id);
    expect(outcome).toBe('pass');
    expect(assessment.inputs.find(({ label }) => label === 'n8')).toEqual({ label: 'n8', sha256: sha256(heatTable(8)), bytes: heatTable(8).length, rows: 64, weightSum: expect.closeTo(1, 12) as number, mesh: { low: [1 / 16, 1 / 16], high: [15 / 16, 15 / 16], duplicates: { rows: 0, oneIn: 1 } } });
    const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    expect(result).toMatchObject({ rows: 64, equalWeights: false, mapping: { x: 'x', y: 'y', weight: 'w', fields: { T: 'T' } } });
    expect(result.weightSum).toBeCloseTo(1, 12);
  });

  it('keeps nothing of a body whose digest differs', async () => {
    const study = await make();
    const sent = { params: { id: study.id, label: 'n8' }, body: heatTable(8) };
    const differs = await refused(engineer, putDataContract, { ...sent, headers: { ...binary, 'repr-digest': digestOf(Buffer.from('other')) } });
    expect(differs).toMatchObject({ status: 400 });
    expect((await refused(engineer, putDataContract, { ...sent, headers: { ...binary, 'repr-digest': 'sha-256=abc' } })).status).toBe(400);
    const kept = await ok(engineer, getStudyContract, { params: { id: study.id } });
    expect(kept).toMatchObject({ planFrozenAt: null });
    expect(kept.grids.every(({ state, upload }) => state === 'expected' && upload === null)).toBe(true);
  });

  it('keeps nothing of a body that stops short of its length', async () => {
    const study = await make();
    const params = { id: study.id, label: 'n8' };
    const url = new URL(addressOf(putDataContract, { params }, engineer), need('WEB_URL'));
    await new Promise<void>((resolve) => {
      const request = http.request(url, { method: 'PUT', headers: { ...headersOf(putDataContract, engineer), ...binary, 'content-length': 5000 } });
      request.on('error', () => resolve());
      request.on('close', () => resolve());
      request.write(heatTable(8).subarray(0, 500));
      setTimeout(() => request.destroy(), 500);
    });
    const kept = await ok(engineer, getStudyContract, { params: { id: study.id } });
    expect(kept.grids.every(({ state }) => state === 'expected')).toBe(true);
  });

  it('refuses more than 100 MB before reading it', async () => {
    const study = await make();
    const url = new URL(addressOf(putDataContract, { params: { id: study.id, label: 'n8' } }, engineer), need('WEB_URL'));
    const status = await new Promise((resolve, reject) => {
      const request = http.request(url, { method: 'PUT', headers: { ...headersOf(putDataContract, engineer), ...binary, 'content-length': 100_000_001 } }, (response) => {
        resolve(response.statusCode);
        request.destroy();
      });
      request.on('error', reject);
      request.write('x,y\n');
    });
    expect(status).toBe(413);
  });

  it('replaces a rejected file, and the study goes on', async () => {
    const study = await make([8, 16, 32, 64]);
    for (const n of [8, 16, 32]) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    const damaged = Buffer.from(heatTable(64).toString().replace(/^(.*\n.*\n[^,]*,[^,]*,[^,]*,).*$/m, '$1nan'));
    await putFile(engineer, { id: study.id, label: 'n64' }, damaged);
    await awaitStudy(engineer, study.id, settled);
    const problem = await refused(engineer, getOutcomeContract, { params: { id: study.id }, query: { wait: 20 } });
    expect(problem).toMatchObject({ status: 409, errors: [{ path: 'grids.n64' }] });
    await putFile(engineer, { id: study.id, label: 'n64' }, heatTable(64));
    expect((await awaitOutcome(engineer, study.id)).outcome).toBe('pass');
    expect((await refused(engineer, putDataContract, { params: { id: study.id, label: 'n64' }, body: heatTable(64), headers: binary })).status).toBe(409);
  });

  it('refuses a file where the case has no field to compare', async () => {
    const made = await ok(engineer, createCaseContract, {
      body: { code: work.code.slug, problem: work.problem.slug, name: 'A value alone', kind: 'solution', quantities: [{ name: 'drag' }] },
    });
    const study = await ok(engineer, createStudyContract, { body: { case: made.slug, release: '1.0.0', grids: [{ label: 'n8', h: 0.125 }] } });
    const problems = [
      await refused(engineer, putDataContract, { params: { id: study.id, label: 'n8' }, body: heatTable(8), headers: binary }),
      await refused(engineer, startUploadContract, { params: { id: study.id, label: 'n8' }, body: { filename: 'n8.csv', bytes: 100 } }),
    ];
    for (const { status, detail } of problems) expect([status, detail]).toEqual([422, expect.stringContaining('declares no field')]);
    expect((await ok(engineer, getStudyContract, { params: { id: study.id } })).planFrozenAt).toBeNull();
  });

  it('is 404 for a grid that is not there and 403 for a reviewer', async () => {
    const study = await make();
    const sent = { body: heatTable(8), headers: binary };
    expect((await refused(engineer, putDataContract, { params: { id: study.id, label: 'n9' }, ...sent })).status).toBe(404);
    const reviewer = await addMember(engineer.at, ['reviewer']);
    expect((await refused(reviewer, putDataContract, { params: { id: study.id, label: 'n8' }, ...sent })).status).toBe(403);
  });
});

describe('the damaged files', () => {
  it.each(readBrokenFiles())('$file is rejected at line $line, column $column', async ({ file, line, column }) => {
    const study = await ok(engineer, createStudyContract, {
      body: { case: (await damagedCase()).slug, release: '1.0.0', grids: [{ label: 'g1', cells: 72 }] },
    });
    await putFile(engineer, { id: study.id, label: 'g1' }, readSolverFile('broken', file));
    const { grids: [grid] } = await awaitStudy(engineer, study.id, settled);
    // Without a mapping that names the weight, a file without one waits to be told.
    expect(grid?.state).toBe(file === 'missing_column.csv' ? 'needs-columns' : 'rejected');
    if (file === 'missing_column.csv') return;
    expect(grid?.upload?.reasons.some((reason) => reason.line === line && (column === null || reason.column === column))).toBe(true);
    const problem = await refused(engineer, getOutcomeContract, { params: { id: study.id } });
    expect(problem.status).toBe(409);
    if (line !== null) expect(problem.errors[0]?.message).toContain(`Line ${line}`);
  });
});

let damaged: Work['case'] | undefined;
async function damagedCase(): Promise<Work['case']> {
  if (damaged) return damaged;
  const problem = await ok(engineer, createProblemContract, { body: { name: 'Poisson', equation: 'poisson', dimension: 2, exact: { u: 'sin(pi*x)*sin(2*pi*y)+x*y^2' } } });
  damaged = await ok(engineer, createCaseContract, {
    body: { code: work.code.slug, problem: problem.slug, name: 'Damaged', kind: 'order', fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder: 2 }] }] },
  });
  return damaged;
}

describe('uploads in parts', () => {
  // Comments make a file of two parts out of a small table.
  const comments = Buffer.from(`# ${'-'.repeat(77)}\n`.repeat(120_000));
  const body = Buffer.concat([heatTable(16), comments]);
  const params = async () => ({ id: (await make()).id, label: 'n16' });

  it('takes parts in any order, shows those stored, and closes once', async () => {
    const at = await params();
    const { upload, partSize } = await ok(engineer, startUploadContract, { params: at, body: { filename: 'n16.csv', bytes: body.length, sha256: sha256(body) } });
    expect(partSize).toBe(8 * 1024 * 1024);
    const { parts } = await ok(engineer, signPartsContract, { params: { id: upload }, body: { numbers: [2, 1] } });
    const sendPart = async (number: number) => {
      const url = parts.find((part) => part.number === number)?.url ?? '';
      const answer = await fetch(url, { method: 'PUT', body: new Uint8Array(body.subarray((number - 1) * partSize, number * partSize)) });
      return { number, etag: answer.headers.get('etag') ?? '' };
    };
    const second = await sendPart(2);
    expect(await ok(engineer, getUploadContract, { params: { id: upload } })).toMatchObject({ state: 'receiving', parts: [{ number: 2 }] });
    const early = await refused(engineer, completeUploadContract, { params: { id: upload }, body: { parts: [second] } });
    expect(early).toMatchObject({ status: 422, errors: [{ path: 'parts' }] });
    const first = await sendPart(1);
    const wrong = await refused(engineer, completeUploadContract, { params: { id: upload }, body: { parts: [{ ...first, etag: second.etag }, second] } });
    expect(wrong.status).toBe(422);
    for (const parts of [[first, second, second], [first, second, { ...second, number: 3 }]]) {
      expect((await refused(engineer, completeUploadContract, { params: { id: upload }, body: { parts } })).status).toBe(422);
    }
    const closed = await ok(engineer, completeUploadContract, { params: { id: upload }, body: { parts: [first, second] } });
    expect(closed).toMatchObject({ id: upload, grid: 'n16' });
    await ok(engineer, completeUploadContract, { params: { id: upload }, body: { parts: [first, second] } });
    const study = await awaitStudy(engineer, at.id, settled);
    expect(study.grids.find(({ label }) => label === 'n16')).toMatchObject({ state: 'read', upload: { id: upload, rows: 256, sha256: sha256(body) } });
    expect((await refused(engineer, signPartsContract, { params: { id: upload }, body: { numbers: [1] } })).status).toBe(409);
    expect((await refused(engineer, deleteUploadContract, { params: { id: upload } })).status).toBe(409);
  });

  it('closes once where two calls do it at the same moment', async () => {
    const at = await params();
    const { upload } = await ok(engineer, startUploadContract, { params: at, body: { filename: 'n16.csv', bytes: heatTable(16).length } });
    const { parts: [part] } = await ok(engineer, signPartsContract, { params: { id: upload }, body: { numbers: [1] } });
    const { headers } = await fetch(part?.url ?? '', { method: 'PUT', body: new Uint8Array(heatTable(16)) });
    const parts = [{ number: 1, etag: headers.get('etag') ?? '' }];
    await Promise.all([1, 2, 3].map(() => ok(engineer, completeUploadContract, { params: { id: upload }, body: { parts } })));
    const study = await awaitStudy(engineer, at.id, settled);
    expect(study.grids.find(({ label }) => label === 'n16')).toMatchObject({ state: 'read', upload: { id: upload } });
  });

  it('gives way to a file sent in one call', async () => {
    const at = await params();
    const { upload } = await ok(engineer, startUploadContract, { params: at, body: { filename: 'n16.csv', bytes: 100 } });
    const whole = await putFile(engineer, at, heatTable(16));
    expect((await refused(engineer, getUploadContract, { params: { id: upload } })).status).toBe(404);
    const study = await awaitStudy(engineer, at.id, settled);
    expect(study.grids.find(({ label }) => label === 'n16')).toMatchObject({ state: 'read', upload: { id: whole.id } });
  });

  it('rejects a file that is not the one stated', async () => {
    const at = await params();
    await sendParts(engineer, at, heatTable(16), sha256(Buffer.from('another file')));
    const study = await awaitStudy(engineer, at.id, settled);
    const grid = study.grids.find(({ label }) => label === 'n16');
    expect(grid).toMatchObject({ state: 'rejected', upload: { reasons: [{ code: 'checksum-differs', found: sha256(heatTable(16)) }] } });
  });

  it('reads or rejects by what is stated when it is closed, and refuses two statements that differ', async () => {
    const bytes = heatTable(16);
    const close = async (stated: string, atStart?: string) => {
      const at = await params();
      const { upload } = await ok(engineer, startUploadContract, { params: at, body: { filename: 'n16.csv', bytes: bytes.length, sha256: atStart } });
      const { parts: [part] } = await ok(engineer, signPartsContract, { params: { id: upload }, body: { numbers: [1] } });
      const { headers } = await fetch(part?.url ?? '', { method: 'PUT', body: new Uint8Array(bytes) });
      const answer = await send(engineer, completeUploadContract, { params: { id: upload }, body: { parts: [{ number: 1, etag: headers.get('etag') ?? '' }], sha256: stated } });
      return { at, answer };
    };
    const [right, wrong] = [sha256(bytes), sha256(Buffer.from('another file'))];
    const gridAfter = async ({ at }: { at: { id: string } }) => (await awaitStudy(engineer, at.id, settled)).grids.find(({ label }) => label === 'n16');
    expect(await gridAfter(await close(right))).toMatchObject({ state: 'read' });
    expect(await gridAfter(await close(wrong))).toMatchObject({ state: 'rejected', upload: { reasons: [{ code: 'checksum-differs', found: right, expected: wrong }] } });
    expect((await close(wrong, right)).answer).toMatchObject({ status: 422, body: { errors: [{ path: 'sha256' }] } });
  });

  it('takes the place of an open upload only where it is the one expected', async () => {
    const at = await params();
    const start = (replaces?: string | null) => send(engineer, startUploadContract, { params: at, body: { filename: 'n16.csv', bytes: 100, replaces } });
    const first = (await start(null)).body as { upload: string };
    const second = await start(null);
    expect(second).toMatchObject({ status: 409, body: { errors: [{ path: 'replaces', message: first.upload }] } });
    expect((second.body as { detail: string }).detail).toContain(`by ${engineer.email}: n16.csv`);
    expect((await start(at.id)).status).toBe(409);
    expect((await start(first.upload)).status).toBe(201);
    expect((await refused(engineer, getUploadContract, { params: { id: first.upload } })).status).toBe(404);
    expect((await start()).status).toBe(201);
  });

  it('takes at most 100 part numbers a call, and addresses that hold as long as they say', async () => {
    const at = await params();
    const { upload } = await ok(engineer, startUploadContract, { params: at, body: { filename: 'n16.csv', bytes: 2e9, fingerprint: sha256(Buffer.from('edges')) } });
    const numbers = (count: number) => Array.from({ length: count }, (_, index) => index + 1);
    expect((await ok(engineer, signPartsContract, { params: { id: upload }, body: { numbers: numbers(100) } })).parts).toHaveLength(100);
    expect((await refused(engineer, signPartsContract, { params: { id: upload }, body: { numbers: numbers(101) } })).status).toBe(422);
    expect(await ok(engineer, getUploadContract, { params: { id: upload } })).toMatchObject({ fingerprint: sha256(Buffer.from('edges')), createdBy: engineer.email });
    const { rows: [row] } = await adminDatabase().query<{ storage_key: string; multipart_id: string }>('select storage_key, multipart_id from uploads where id = $1', [upload]);
    const storage = createStorage({ ...storageOptionsOf(readEnv(process.env)), partLifetimeSeconds: 1 });
    const url = await storage.signPart(row?.storage_key ?? '', row?.multipart_id ?? '', 1);
    await new Promise((resolve) => setTimeout(resolve, 2500));
    expect((await fetch(url, { method: 'PUT', body: 'late' })).status).toBe(403);
    await ok(engineer, deleteUploadContract, { params: { id: upload } });
  });

  it('is given up without a trace, and the grid has the file it had', async () => {
    const at = await params();
    const first = await putFile(engineer, at, heatTable(16));
    await awaitStudy(engineer, at.id, settled);
    const { upload } = await ok(engineer, startUploadContract, { params: at, body: { filename: 'again.csv', bytes: 100 } });
    expect((await ok(engineer, getStudyContract, { params: { id: at.id } })).grids.find(({ label }) => label === 'n16')?.state).toBe('receiving');
    await ok(engineer, deleteUploadContract, { params: { id: upload } });
    expect((await refused(engineer, getUploadContract, { params: { id: upload } })).status).toBe(404);
    const study = await awaitStudy(engineer, at.id, settled);
    expect(study.grids.find(({ label }) => label === 'n16')).toMatchObject({ state: 'read', upload: { id: first.id } });
  });

  it('signs no part beyond the last, opens none for an empty file, and hides from others', async () => {
    const at = await params();
    expect((await refused(engineer, startUploadContract, { params: at, body: { filename: 'empty.csv', bytes: 0 } })).status).toBe(422);
    const { upload } = await ok(engineer, startUploadContract, { params: at, body: { filename: 'n16.csv', bytes: 100 } });
    expect((await refused(engineer, signPartsContract, { params: { id: upload }, body: { numbers: [2] } })).status).toBe(422);
    const stranger = await signUp('Strangers');
    expect((await refused(stranger, getUploadContract, { params: { id: upload } })).status).toBe(404);
    expect((await send(stranger, deleteUploadContract, { params: { id: upload } })).status).toBe(404);
  });
});
