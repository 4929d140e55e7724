import { spawn, type ChildProcess } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { need } from '../environment';

/** A process of this test run; whoever started it starts it again when it dies. */
export function pidOf(name: string): number {
  return Number(fs.readFileSync(path.join(need('TEST_PID_FOLDER'), `${name}.pid`), 'utf8').split(' ')[0]);
}

/** To the process as it is now; one that is just being started again is left alone. */
export function signal(name: string, kind: 'SIGKILL' | 'SIGSTOP' | 'SIGCONT'): void {
  try {
    process.kill(pidOf(name), kind);
  } catch (error) {
    if ((error as { code?: unknown }).code !== 'ESRCH') throw error;
  }
}

/** Another worker on the same queue; `end` kills it by force. */
export function startWorker(): { process: ChildProcess; end: () => Promise<void> } {
  const child = spawn(process.execPath, [path.join(need('TEST_BUILD_FOLDER'), 'worker/main.mjs')], {
    env: { ...process.env, NODE_ENV: 'production', METRICS_PORT: '' }, stdio: 'ignore',
  });
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  return {
    process: child,
    end: () => {
      child.kill('SIGKILL');
      return ended;
    },
  };
}
