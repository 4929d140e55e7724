import path from 'node:path';
import { PassThrough } from 'node:stream';
import { root } from './places.mjs';
import { run } from './processes.mjs';

/** @param {Record<string, string>} env */
export async function migrate(env) {
  await run({
    command: process.execPath,
    args: ['--import', 'tsx', 'db/migrate.ts'],
    cwd: root,
    env: { ...process.env, ...env },
  });
}

/** @param {string} build @param {number} port @param {Record<string, string>} env @returns {import('./supervisor.mjs').Service} */
export function webService(build, port, env) {
  return {
    name: 'web',
    line: {
      command: process.execPath,
      args: ['--enable-source-maps', '--import', path.join(build, 'web/web-start.mjs'), path.join(build, 'web/server.js')],
      env: { ...process.env, ...env, HOSTNAME: '127.0.0.1', PORT: String(port), NEXT_TELEMETRY_DISABLED: '1' },
    },
    seconds: 60,
    isReady: async () => {
      try {
        const response = await fetch(`http://127.0.0.1:${port}/api/v1/ready`, { signal: AbortSignal.timeout(5000) });
        await response.arrayBuffer();
        return response.ok;
      } catch {
        return false;
      }
    },
  };
}

/** @param {string} build @param {Record<string, string>} env @returns {import('./supervisor.mjs').Service} */
export function workerService(build, env) {
  return {
    name: 'worker',
    line: {
      command: process.execPath,
      args: ['--enable-source-maps', path.join(build, 'worker/main.mjs')],
      env: { ...process.env, ...env, NODE_ENV: 'production' },
    },
    // It waits for the queue by itself and takes work when it can: nothing to be reached.
    isReady: () => Promise.resolve(true),
  };
}

/**
 * The demo's members, then its cases and studies through the HTTP API. Both do nothing when it was done before.
 * @param {string} build @param {number} port @param {Record<string, string>} env
 * @param {import('./logs.mjs').LogSink} log
 */
export async function seedDemo(build, port, env, log) {
  const lines = new PassThrough();
  log('demo', lines);
  const onOutput = (/** @type {string} */ text) => lines.write(text);
  const withWeb = { ...process.env, ...env, WEB_URL: `http://127.0.0.1:${port}` };
  const command = process.execPath;
  const members = [path.join(build, 'worker/commands/seed-demo-members.mjs')];
  await run({ command, args: members, cwd: root, env: withWeb, onOutput });
  await run({ command, args: ['--import', 'tsx', 'fixtures/demo/seed.ts'], cwd: root, env: withWeb, onOutput });
  lines.end();
}
