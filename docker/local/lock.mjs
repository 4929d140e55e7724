import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { stateFolder } from './places.mjs';

/** @typedef {{ release: () => void }} Lock */

/**
 * Holds the kernel's lock on a file through a small child, so that the lock is gone the moment this process is,
 * however it ends.
 * @param {string} file @param {string[]} flags @returns {Promise<Lock | null>}
 */
function hold(file, flags) {
  return new Promise((resolve, reject) => {
    const script = 'echo held; exec cat >/dev/null';
    const child = spawn('/usr/bin/flock', ['--exclusive', ...flags, file, 'sh', '-c', script], {
      stdio: ['pipe', 'pipe', 'inherit'],
      detached: true,
    });
    child.once('error', reject);
    child.once('exit', () => resolve(null));
    child.stdout.once('data', () => {
      fs.writeFileSync(`${file}.holder`, String(process.pid));
      child.unref();
      child.stdin.unref?.();
      child.stdout.destroy();
      resolve({ release: () => child.stdin.end() });
    });
  });
}

/** @param {string} file */
function holderOf(file) {
  try {
    return fs.readFileSync(`${file}.holder`, 'utf8');
  } catch {
    return 'unknown';
  }
}

/**
 * @param {string} name of the lock
 * @param {{ whenBusy: (holder: string) => string, wait: boolean }} options `whenBusy` words the message when another
 *   process holds it; with `wait` it is printed and waited for, else thrown
 * @returns {Promise<Lock>}
 */
export async function acquireLock(name, { whenBusy, wait }) {
  const folder = path.join(stateFolder, 'locks');
  fs.mkdirSync(folder, { recursive: true });
  const file = path.join(folder, name);
  const first = await hold(file, ['--nonblock']);
  if (first) return first;
  const message = whenBusy(holderOf(file));
  if (!wait) throw new Error(message);
  console.log(message);
  const second = await hold(file, []);
  if (!second) throw new Error(`The lock ${file} could not be taken.`);
  return second;
}

/**
 * @template T
 * @param {string} name @param {string} waitingFor @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function withLock(name, waitingFor, work) {
  const lock = await acquireLock(name, {
    wait: true,
    whenBusy: (holder) => `Waiting for ${waitingFor} by process ${holder} …`,
  });
  try {
    return await work();
  } finally {
    lock.release();
  }
}
