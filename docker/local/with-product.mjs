// Runs a program beside services and a web server of their own, without a worker: it starts those it measures.
import fs from 'node:fs';
import path from 'node:path';
import { ensureBuild } from './build.mjs';
import { productEnvironment, testEnvironment } from './environment.mjs';
import { install } from './install.mjs';
import { onInterruption } from './interruption.mjs';
import { acquireLock } from './lock.mjs';
import { logToFolder } from './logs.mjs';
import { root } from './places.mjs';
import { assertPortsFree, portsOf } from './ports.mjs';
import { migrate, webService } from './product.mjs';
import { run, stopRunning } from './processes.mjs';
import { runFolder, startServices } from './services.mjs';
import { awaitEarlierProcesses, createSupervisor } from './supervisor.mjs';

const NAME = 'test';
const folder = runFolder(NAME);
const logFolder = path.join(folder, 'logs');
const pidFolder = path.join(folder, 'pids');
const supervisor = createSupervisor({ pidFolder, log: logToFolder(logFolder) });

async function runProgram() {
  const [program, ...args] = process.argv.slice(2);
  if (!program) throw new Error('Say which program.');
  await install(NAME);
  await acquireLock(NAME, { wait: true, whenBusy: (holder) => `Waiting for a test run in this folder (process ${holder}) …` });
  await awaitEarlierProcesses(pidFolder);
  const ports = portsOf(NAME);
  await assertPortsFree(NAME, ports);
  for (const name of ['postgres', 'redis', 'storage', 'mail', 'logs']) fs.rmSync(path.join(folder, name), { recursive: true, force: true });
  fs.mkdirSync(logFolder, { recursive: true });
  const env = productEnvironment(ports, {});
  const [build] = await Promise.all([ensureBuild(), startServices(NAME, supervisor, ports, env)]);
  await migrate(env);
  await supervisor.start(webService(build, ports.web, env));
  await run({
    command: process.execPath,
    args: ['--import', 'tsx', program, ...args],
    cwd: root,
    env: { ...process.env, ...env, ...testEnvironment(ports), TEST_BUILD_FOLDER: build, TEST_LOG_FOLDER: logFolder },
    onOutput: (text) => process.stdout.write(text),
  });
}

onInterruption(async () => supervisor.stop(), null);

let status = 0;
try {
  await runProgram();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  status = 1;
}
await supervisor.stop();
await stopRunning();
process.exit(status);
