import { createHash } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import { createStudyContract, getGridResultContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { completeUploadContract, putDataContract, signPartsContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { heatTable } from '../grids';
import type { Person } from '../people';
import type { Work } from '../work';
import { insist, insistOnPart, Refused } from './careful-client';
import type { Lane } from './plan';

const sizes = [4, 8, 16, 32];
export interface Site { engineer: Person; work: Work }
export interface Acknowledged { label: string; sha256: string }

const errorOf = (converges: boolean) => (h: number) => (converges ? 0.3 * h * h : 0.3 * h);
const sha256Of = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');
const badTable = Buffer.from('x,y,w,T\n0.1,0.1,0.5,one\n');

/** The L2 norm of the error that the table of n × n cells was given, by the definition. */
function expectedNorm(n: number, converges: boolean): number {
  const h = 1 / n;
  let sum = 0;
  for (let i = 0; i < n; i += 1) sum += n * h * h * (errorOf(converges)(h) * (1 + 0.5 * Math.sin(Math.PI * (i + 0.5) * h))) ** 2;
  return Math.sqrt(sum);
}

async function sendParts(who: Person, params: { id: string; label: string }, bytes: Buffer): Promise<void> {
  const { upload } = await insist(who, startUploadContract, { params, body: { filename: `${params.label}.csv`, bytes: bytes.length, sha256: sha256Of(bytes) } });
  const { parts: [part] } = await insist(who, signPartsContract, { params: { id: upload }, body: { numbers: [1] } });
  const etag = await insistOnPart(part?.url ?? '', bytes);
  await insist(who, completeUploadContract, { params: { id: upload }, body: { parts: [{ number: 1, etag }] } });
}

/** Whether the grid has the file: a call whose answer was lost may have been carried out, and the study gone on since. */
async function isThere(who: Person, id: string, { label, sha256 }: Acknowledged): Promise<boolean> {
  const study = await insist(who, getStudyContract, { params: { id } });
  const grid = study.grids.find((grid) => grid.label === label);
  return study.state !== 'collecting' && grid?.upload?.sha256 === sha256;
}

async function sendFile(who: Person, params: { id: string; label: string }, { bytes, sending }: { bytes: Buffer; sending: Lane['sending'] }): Promise<Acknowledged> {
  const acknowledged = { label: params.label, sha256: sha256Of(bytes) };
  for (let tries = 1; ; tries += 1) {
    try {
      if (sending === 'parts') await sendParts(who, params, bytes);
      else await insist(who, putDataContract, { params, query: { filename: `${params.label}.csv` }, body: bytes });
      return acknowledged;
    } catch (error) {
      if (!(error instanceof Refused) || tries === 4) throw error;
      if (await isThere(who, params.id, acknowledged)) return acknowledged;
    }
  }
}

async function awaitState(who: Person, id: string, isWanted: (study: Study) => boolean): Promise<Study> {
  const deadline = Date.now() + 75_000;
  for (;;) {
    const study = await insist(who, getStudyContract, { params: { id } });
    if (isWanted(study)) return study;
    if (Date.now() > deadline) throw new Error(`The study ${id} stays ${study.state}${study.failure ? ` (${study.failure})` : ''}: ${study.grids.map(({ label, state }) => `${label} ${state}`).join(', ')}.`);
    await pause(150);
  }
}

/** Makes a study and sends its files as the lane says; what it was told is kept. */
export async function carryOut({ engineer, work }: Site, lane: Lane): Promise<{ id: string; acknowledged: Acknowledged[] }> {
  await pause(lane.begins);
  const { id } = await insist(engineer, createStudyContract, {
    body: { case: work.case.slug, release: '1.0.0', grids: sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
  });
  if (lane.badFileFirst) {
    await sendFile(engineer, { id, label: 'n4' }, { bytes: badTable, sending: lane.sending });
    await awaitState(engineer, id, ({ grids }) => grids.some(({ label, state }) => label === 'n4' && state === 'rejected'));
  }
  const acknowledged = await Promise.all(sizes.map((n) =>
    sendFile(engineer, { id, label: `n${n}` }, { bytes: heatTable(n, { error: errorOf(lane.converges) }), sending: lane.sending })));
  return { id, acknowledged };
}

/** What the client sees at the end against what it was told and what must come out: what is wrong, in words. */
export async function faultsSeen({ engineer }: Site, lane: Lane, { id, acknowledged }: { id: string; acknowledged: Acknowledged[] }): Promise<string[]> {
  const study = await awaitState(engineer, id, ({ state }) => state === 'assessed' || state === 'assessment-failed');
  const faults: string[] = [];
  const wanted = lane.converges ? 'pass' : 'fail';
  if (study.state !== 'assessed' || study.assessment?.outcome !== wanted) faults.push(`study ${id} is ${study.state} with ${study.assessment?.outcome ?? 'no outcome'}; ${wanted} was to come`);
  if (study.failure !== null) faults.push(`study ${id} is assessed and still says: ${study.failure}`);
  for (const { label, sha256 } of acknowledged) {
    const grid = study.grids.find((grid) => grid.label === label);
    if (grid?.upload?.sha256 !== sha256) faults.push(`grid ${label} of ${id} has ${grid?.upload?.sha256 ?? 'no file'}; ${sha256} was acknowledged`);
    const result = await insist(engineer, getGridResultContract, { params: { id, label } });
    const expected = expectedNorm(Number(label.slice(1)), lane.converges);
    const found = result.fields[0]?.L2 ?? Number.NaN;
    if (!(Math.abs(found - expected) <= 1e-12)) faults.push(`grid ${label} of ${id} has L2 ${found}; ${expected} was to come`);
  }
  return faults;
}
