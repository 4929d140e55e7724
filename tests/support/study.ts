import { setTimeout as pause } from 'node:timers/promises';
import { expect } from 'vitest';
import { getOutcomeContract, getStudyContract, type OutcomeAnswer, type Study } from '@/lib/domain/studies/schema';
import {
  completeUploadContract, putDataContract, signPartsContract, startUploadContract, type Upload,
} from '@/lib/domain/uploads/schema';
import { ok, send, type Who } from './api';

type GridPlace = { id: string; label: string };

/** Sends a file in one call. */
export function putFile(who: Who, params: GridPlace, bytes: Buffer, headers: Record<string, string> = {}): Promise<Upload> {
  return ok(who, putDataContract, { params, query: { filename: `${params.label}.csv` }, body: bytes, headers: { 'content-type': 'application/octet-stream', ...headers } });
}

/** Sends a file in parts straight to storage, as a browser does. */
export async function sendParts(who: Who, params: GridPlace, bytes: Buffer, sha256?: string): Promise<Upload> {
  const { upload, partSize } = await ok(who, startUploadContract, { params, body: { filename: `${params.label}.csv`, bytes: bytes.length, sha256 } });
  const numbers = Array.from({ length: Math.ceil(bytes.length / partSize) }, (_, index) => index + 1);
  const { parts } = await ok(who, signPartsContract, { params: { id: upload }, body: { numbers } });
  const sent = await Promise.all(parts.map(async ({ number, url }) => {
    const response = await fetch(url, { method: 'PUT', body: new Uint8Array(bytes.subarray((number - 1) * partSize, number * partSize)) });
    expect(response.status).toBe(200);
    return { number, etag: response.headers.get('etag') ?? '' };
  }));
  return ok(who, completeUploadContract, { params: { id: upload }, body: { parts: sent } });
}

/** Waits for the outcome, at most a minute. */
export async function awaitOutcome(who: Who, id: string): Promise<OutcomeAnswer> {
  const response = await send(who, getOutcomeContract, { params: { id }, query: { wait: 60 } });
  if (response.status !== 200) throw new Error(`The outcome answered ${response.status}: ${response.text}`);
  return response.body as OutcomeAnswer;
}

/** Reads the study until it is as wanted, at most 30 seconds. */
export async function awaitStudy(who: Who, id: string, isWanted: (study: Study) => boolean): Promise<Study> {
  const deadline = Date.now() + 30_000;
  for (;;) {
    const study = await ok(who, getStudyContract, { params: { id } });
    if (isWanted(study)) return study;
    if (Date.now() > deadline) throw new Error(`The study stays ${study.state}: ${study.grids.map(({ label, state }) => `${label} ${state}`).join(', ')}.`);
    await pause(200);
  }
}
