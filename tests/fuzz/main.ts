import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { Worker } from 'node:worker_threads';
import type { FuzzMessage, FuzzTask } from './fuzz-thread';
import { seeds } from './seeds/seeds';

/** A thread does not take over how this process loads TypeScript. */
const startThread = `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(new URL('./fuzz-thread.ts', import.meta.url).href)}); });`;
const found = path.join(import.meta.dirname, '..', '..', '.fourfold', 'fuzz');
const silenceMilliseconds = 30_000;
const mostGrowthMb = 150;
const mostFaults = 10;
const megabytes = () => Math.round(process.memoryUsage.rss() / 1e6);

function keep(reader: string, bytes: Uint8Array): string {
  fs.mkdirSync(found, { recursive: true });
  const file = path.join(found, `${reader}-${createHash('sha256').update(bytes).digest('hex').slice(0, 12)}`);
  fs.writeFileSync(file, bytes);
  return file;
}

/** Fuzzes one reader for some minutes; what went wrong, in words. */
function fuzz(reader: string, minutes: number, seed: number): Promise<string[]> {
  const current = new SharedArrayBuffer(4 + 1024 * 1024);
  const thread = new Worker(startThread, { eval: true, workerData: { reader, seed, milliseconds: minutes * 60_000, current } satisfies FuzzTask });
  const faults: string[] = [];
  let early = 0;
  let tried = 0;
  return new Promise((resolve) => {
    const end = () => {
      clearTimeout(silence);
      clearTimeout(warm);
      const grown = early > 0 ? megabytes() - early : 0;
      if (grown > mostGrowthMb) faults.push(`memory grew by ${grown} MB`);
      console.log(`${reader}: ${tried} files in ${minutes} min, seed ${seed}; memory ${early} -> ${megabytes()} MB; ${faults.length} faults`);
      void thread.terminate().then(() => resolve(faults));
    };
    const hang = () => {
      const bytes = new Uint8Array(current, 4, new Uint32Array(current, 0, 1)[0]);
      faults.push(`${reader}: said nothing for ${silenceMilliseconds / 1000} s: ${keep(reader, Uint8Array.from(bytes))}`);
      end();
    };
    let silence = setTimeout(hang, silenceMilliseconds);
    const warm = setTimeout(() => { early = megabytes(); }, minutes * 60_000 / 5);
    thread.on('message', (message: FuzzMessage) => {
      tried = message.tried;
      clearTimeout(silence);
      silence = setTimeout(hang, silenceMilliseconds);
      if ('fault' in message) {
        faults.push(`${reader}: ${keep(reader, message.bytes)}: ${message.fault}`);
        console.log(faults.at(-1));
        if (faults.length >= mostFaults) end();
      } else if ('ended' in message) end();
    });
    thread.on('error', (error) => {
      faults.push(`${reader}: the thread failed: ${error.stack ?? error.message}`);
      end();
    });
  });
}

const [asked = 'all', minutes = '10', seed = String(Date.now() % 2 ** 31)] = process.argv.slice(2);
const readers = asked === 'all' ? Object.keys(seeds) : [asked];
const faults: string[] = [];
for (const reader of readers) faults.push(...await fuzz(reader, Number(minutes), Number(seed)));
for (const fault of faults) console.log(fault);
process.exit(faults.length === 0 ? 0 : 1);
