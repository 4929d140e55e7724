import { gzipSync } from 'node:zlib';
import { parentPort, workerData } from 'node:worker_threads';
import { oneOf, seeded, upTo } from '@/tests/support/random';
import { mutate } from './mutate';
import { seeds } from './seeds/seeds';
import { tryFile } from './try-file';

export interface FuzzTask { reader: string; seed: number; milliseconds: number; current: SharedArrayBuffer }
/** Now and then, or where a file went wrong. */
export type FuzzMessage = { tried: number } | { tried: number; fault: string; bytes: Uint8Array } | { tried: number; ended: true };

if (!parentPort) throw new Error('fuzz-thread runs as a worker thread only.');
const port = parentPort;
const { reader, seed, milliseconds, current } = workerData as FuzzTask;
const make = seeds[reader];
if (!make) throw new Error(`No reader ${reader}; there are ${Object.keys(seeds).join(', ')}.`);
const random = seeded(seed);
const length = new Uint32Array(current, 0, 1);
const room = new Uint8Array(current, 4);
const toldEveryMilliseconds = 1000;
const corpus: Buffer[] = [];
while (corpus.length < 20) corpus.push(await make(random));

let tried = 0;
let toldAt = Date.now();
for (const end = Date.now() + milliseconds; Date.now() < end;) {
  if (random() < 0.2) corpus[upTo(random, corpus.length - 1)] = await make(random);
  let bytes = mutate(oneOf(random, corpus), oneOf(random, corpus), random);
  // What was changed is changed further now and then.
  if (random() < 0.1 && bytes.length > 0) corpus[upTo(random, corpus.length - 1)] = bytes;
  if (random() < 0.1) bytes = gzipSync(bytes);
  if (random() < 0.02) bytes = mutate(gzipSync(bytes), oneOf(random, corpus), random);
  bytes = bytes.subarray(0, room.length);
  room.set(bytes);
  length[0] = bytes.length;
  const cuts = Array.from({ length: upTo(random, 6) }, () => upTo(random, bytes.length));
  const fault = await tryFile(bytes, cuts);
  tried += 1;
  if (fault !== null) port.postMessage({ tried, fault, bytes: Uint8Array.from(bytes) } satisfies FuzzMessage);
  else if (Date.now() - toldAt > toldEveryMilliseconds) {
    toldAt = Date.now();
    port.postMessage({ tried } satisfies FuzzMessage);
  }
}
port.postMessage({ tried, ended: true } satisfies FuzzMessage);
