import { spawn, type ChildProcess } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { need } from './environment';

export interface ExtraProcess {
  child: ChildProcess;
  /** Asks it to end, and waits until it has: with which status. */
  end(signal?: NodeJS.Signals): Promise<number | null>;
  log: string;
}

/** One more process of the product beside those of the test run, from the same build; its lines go to the same folder. */
function startExtra(name: string, args: string[], env: Record<string, string>): ExtraProcess {
  const log = path.join(need('TEST_LOG_FOLDER'), `${name}.log`);
  const out = fs.openSync(log, 'a');
  // The kernel ends it with the test run, even one that is killed.
  const [file, ...rest] = ['setpriv', '--pdeathsig', 'KILL', '--', process.execPath, ...args] as const;
  const child = spawn(file, rest, { env: { ...process.env, ...env, NODE_ENV: 'production' }, stdio: ['ignore', out, out] });
  fs.closeSync(out);
  const ended = new Promise<number | null>((resolve) => child.once('exit', resolve));
  return {
    child, log,
    end(signal = 'SIGTERM') {
      child.kill(signal);
      return ended;
    },
  };
}

async function untilAnswers(url: string, { child, log }: ExtraProcess): Promise<void> {
  for (let tries = 0; tries < 150; tries += 1) {
    if (child.exitCode !== null) break;
    const response = await fetch(url, { signal: AbortSignal.timeout(5000) }).catch(() => null);
    await response?.arrayBuffer();
    if (response?.ok) return;
    await pause(100);
  }
  throw new Error(`${url} does not answer; see ${log}.`);
}

/** One more web process, once it is ready. */
export async function startWeb(name: string, port: number, env: Record<string, string> = {}): Promise<ExtraProcess> {
  const web = path.join(need('TEST_BUILD_FOLDER'), 'web');
  const started = startExtra(name, ['--enable-source-maps', '--import', path.join(web, 'web-start.mjs'), path.join(web, 'server.js')], {
    HOSTNAME: '127.0.0.1', PORT: String(port), ...env,
  });
  await untilAnswers(`http://127.0.0.1:${port}/api/v1/ready`, started);
  return started;
}

/** One more worker process, once it takes work; it serves its metrics on the port. */
export async function startWorker(name: string, metricsPort: number, env: Record<string, string> = {}): Promise<ExtraProcess> {
  const started = startExtra(name, [path.join(need('TEST_BUILD_FOLDER'), 'worker/main.mjs')], { METRICS_PORT: String(metricsPort), ...env });
  await untilAnswers(`http://127.0.0.1:${metricsPort}/metrics`, started);
  return started;
}
