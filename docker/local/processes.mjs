import { spawn } from 'node:child_process';
import fs from 'node:fs';

/** @typedef {{ command: string, args: string[], env?: Record<string, string | undefined>, cwd?: string,
 *   before?: string[], deathSignal?: 'INT' | 'TERM' | 'KILL' }} CommandLine */

/** Children that run now, so that an interrupted start-up leaves none behind. */
const running = new Set();

/**
 * Starts a child in its own process group, which the kernel signals when this process dies, even by kill -9.
 * @param {CommandLine} line `before` wraps the whole, outside of what sets the death signal
 * @returns {import('node:child_process').ChildProcessByStdio<null, import('node:stream').Readable, import('node:stream').Readable>}
 */
export function launch({ command, args, env, cwd, before = [], deathSignal = 'TERM' }) {
  const [file, ...rest] = [...before, 'setpriv', '--pdeathsig', deathSignal, '--', command, ...args];
  const child = spawn(file, rest, { cwd, env: env ?? process.env, detached: true, stdio: ['ignore', 'pipe', 'pipe'] });
  running.add(child);
  child.once('close', () => running.delete(child));
  child.once('error', () => running.delete(child));
  return child;
}

/**
 * Runs a command to its end.
 * @param {CommandLine & { onOutput?: (text: string) => void }} line
 * @returns {Promise<string>} what it printed on standard output; it rejects with the last lines when the command fails
 */
export function run({ onOutput, ...line }) {
  return new Promise((resolve, reject) => {
    const child = launch(line);
    let stdout = '';
    let everything = '';
    const take = (/** @type {Buffer} */ chunk) => {
      everything = (everything + chunk).slice(-8000);
      onOutput?.(chunk.toString());
    };
    child.stdout.on('data', (chunk) => {
      stdout += chunk;
      take(chunk);
    });
    child.stderr.on('data', take);
    child.once('error', reject);
    child.once('close', (code, signal) => {
      if (code === 0) return resolve(stdout);
      const how = signal ? `was stopped by ${signal}` : `ended with status ${code}`;
      const words = `${line.command} ${line.args.slice(0, 3).join(' ')} ${how}`;
      reject(new Error(onOutput ? `${words}.` : `${words}:\n${everything.trim()}`));
    });
  });
}

/** @param {import('node:child_process').ChildProcess} child @param {NodeJS.Signals} signal @param {number} patience ms */
export function stopChild(child, signal, patience) {
  if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve();
  return /** @type {Promise<void>} */ (
    new Promise((resolve) => {
      const force = setTimeout(() => child.kill('SIGKILL'), patience);
      child.once('exit', () => {
        clearTimeout(force);
        resolve();
      });
      child.kill(signal);
    })
  );
}

/** Ends whatever still runs: commands interrupted half-way. */
export function stopRunning() {
  return Promise.all([...running].map((child) => stopChild(child, 'SIGTERM', 5000)));
}

/** State, parent and beginning of a process, as the kernel tells them. @param {number} pid */
function statOf(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return { isZombie: fields[0] === 'Z', parent: Number(fields[1]), beginning: fields[19] ?? null };
  } catch {
    return null;
  }
}

/** The moment a process began, in the kernel's ticks: with the id it names one process for good. @param {number} pid */
export function beginningOf(pid) {
  const stat = statOf(pid);
  return stat === null || stat.isZombie ? null : stat.beginning;
}

/** @param {number} pid @returns {number | null} */
export const parentOf = (pid) => statOf(pid)?.parent ?? null;

/** @param {number} milliseconds */
export const pause = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));

/**
 * @param {string} what for the message @param {number} seconds @param {() => Promise<boolean>} isReady
 * @param {() => void} [assertAlive] throws when waiting has become pointless
 */
export async function waitUntil(what, seconds, isReady, assertAlive) {
  const deadline = Date.now() + seconds * 1000;
  while (Date.now() < deadline) {
    assertAlive?.();
    if (await isReady()) return;
    await pause(100);
  }
  throw new Error(`${what} was not ready after ${seconds} seconds.`);
}
