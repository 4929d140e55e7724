import fs from 'node:fs';
import path from 'node:path';
import { ensureBuild } from './build.mjs';
import { productEnvironment } from './environment.mjs';
import { acquireLock } from './lock.mjs';
import { assertPortsFree, portsOf } from './ports.mjs';
import { migrate } from './product.mjs';
import { runFolder, startServices } from './services.mjs';
import { awaitEarlierProcesses } from './supervisor.mjs';

export const TEST_RUN = 'test';
const folder = runFolder(TEST_RUN);
export const testPidFolder = path.join(folder, 'pids');
export const testLogFolder = path.join(folder, 'logs');
export const testReportFolder = path.join(folder, 'reports');

/**
 * Services of the tests with nothing in them, and a build: one run of them at a time in this folder.
 * @param {ReturnType<typeof import('./supervisor.mjs').createSupervisor>} supervisor
 */
export async function startFreshServices(supervisor) {
  const ports = portsOf(TEST_RUN);
  await acquireLock(TEST_RUN, { wait: true, whenBusy: (holder) => `Waiting for another test run in this folder (process ${holder}) …` });
  await awaitEarlierProcesses(testPidFolder);
  await assertPortsFree(TEST_RUN, ports);
  for (const name of ['postgres', 'redis', 'storage', 'mail', 'logs']) fs.rmSync(path.join(folder, name), { recursive: true, force: true });
  fs.mkdirSync(testLogFolder, { recursive: true });
  const env = productEnvironment(ports, { LOG_LEVEL: process.env.LOG_LEVEL });
  const [build] = await Promise.all([ensureBuild(), startServices(TEST_RUN, supervisor, ports, env)]);
  await migrate(env);
  return { ports, env, build };
}
