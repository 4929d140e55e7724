import fs from 'node:fs';
import path from 'node:path';
import { say } from './logs.mjs';
import { beginningOf, launch, pause, stopChild, waitUntil } from './processes.mjs';

/** @typedef {import('./processes.mjs').CommandLine} CommandLine */
/** @typedef {{ name: string, line: CommandLine, isReady: () => Promise<boolean>, seconds?: number,
 *   stopSignal?: NodeJS.Signals, patience?: number, beforeStart?: () => void,
 *   isWorthShowing?: (line: string) => boolean }} Service */
/** @typedef {{ start: (service: Service) => Promise<void>, stop: () => Promise<void> }} Supervisor */

const LONGEST_BACKOFF = 15_000;
const STEADY_AFTER = 30_000;

/**
 * Children of an earlier supervisor that was killed get a moment to end before their ports are wanted.
 * @param {string} folder of process id files
 */
export async function awaitEarlierProcesses(folder) {
  fs.mkdirSync(folder, { recursive: true });
  for (const name of fs.readdirSync(folder)) {
    const [pid, beginning] = fs.readFileSync(path.join(folder, name), 'utf8').split(' ');
    const isAlive = () => beginning !== undefined && beginningOf(Number(pid)) === beginning;
    for (let tries = 0; isAlive() && tries < 150; tries++) await pause(100);
    if (isAlive()) process.kill(Number(pid), 'SIGKILL');
    fs.rmSync(path.join(folder, name), { force: true });
  }
}

/**
 * Keeps services running: starts them, waits until each is ready, starts one again when it ends by itself
 * (waiting longer each time), stops them in reverse order.
 * @param {{ pidFolder: string, log: import('./logs.mjs').LogSink, longestBackoff?: number }} options @returns {Supervisor}
 */
export function createSupervisor({ pidFolder, log, longestBackoff = LONGEST_BACKOFF }) {
  let isStopping = false;
  /** @type {{ service: Service, child: ReturnType<typeof launch> }[]} */
  const entries = [];

  /** @param {Service} service */
  function spawnService(service) {
    service.beforeStart?.();
    const child = launch(service.line);
    for (const stream of [child.stdout, child.stderr]) log(service.name, stream, service.isWorthShowing);
    if (child.pid) {
      fs.writeFileSync(path.join(pidFolder, `${service.name}.pid`), `${child.pid} ${beginningOf(child.pid)}`);
    }
    child.once('error', (error) => say(`${service.name} cannot be started: ${error.message}`));
    return child;
  }

  /** @param {{ service: Service, child: ReturnType<typeof launch> }} entry @param {number} backoff */
  function keepAlive(entry, backoff) {
    const since = Date.now();
    entry.child.once('exit', (code, signal) => {
      if (isStopping) return;
      const wait = Date.now() - since > STEADY_AFTER ? 500 : backoff;
      say(`${entry.service.name} ended (${signal ?? `status ${code}`}); it starts again in ${wait / 1000} s`);
      setTimeout(() => {
        if (isStopping) return;
        entry.child = spawnService(entry.service);
        keepAlive(entry, Math.min(wait * 2, longestBackoff));
      }, wait);
    });
  }

  return {
    async start(service) {
      if (isStopping) throw new Error('Stopping.');
      const entry = { service, child: spawnService(service) };
      entries.push(entry);
      await waitUntil(service.name, service.seconds ?? 30, service.isReady, () => {
        if (isStopping) throw new Error('Stopping.');
        if (entry.child.exitCode !== null || entry.child.signalCode !== null) {
          throw new Error(`${service.name} ended while starting; its lines above say why.`);
        }
      });
      keepAlive(entry, 500);
    },
    async stop() {
      isStopping = true;
      const stages = [(/** @type {string} */ name) => name === 'web' || name.startsWith('worker'), () => true];
      for (const isInStage of stages) {
        const now = entries.filter(({ service }) => isInStage(service.name));
        await Promise.all(
          now.map(({ service, child }) => stopChild(child, service.stopSignal ?? 'SIGTERM', service.patience ?? 10_000)),
        );
      }
      for (const { service } of entries) fs.rmSync(path.join(pidFolder, `${service.name}.pid`), { force: true });
    },
  };
}
