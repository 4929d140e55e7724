import path from 'node:path';
import { ensureBuild } from './build.mjs';
import { productEnvironment } from './environment.mjs';
import { install } from './install.mjs';
import { onInterruption } from './interruption.mjs';
import { acquireLock } from './lock.mjs';
import { logToConsole, say } from './logs.mjs';
import { assertPortsFree, portsOf } from './ports.mjs';
import { migrate, seedDemo, webService, workerService } from './product.mjs';
import { stopRunning } from './processes.mjs';
import { runFolder, startServices } from './services.mjs';
import { awaitEarlierProcesses, createSupervisor } from './supervisor.mjs';

const NAME = 'start';
const DEMO_ACCOUNTS = [
  ['owner@northmoor.example', 'owner'],
  ['engineer@northmoor.example', 'engineer'],
  ['reviewer@northmoor.example', 'reviewer'],
  ['auditor@northmoor.example', 'auditor'],
  ['engineer@southbank.example', 'another organisation, which sees nothing of the first'],
];

const pidFolder = path.join(runFolder(NAME), 'pids');
const supervisor = createSupervisor({ pidFolder, log: logToConsole });

/**
 * @param {Record<string, string>} env @param {import('./ports.mjs').Ports} ports
 * @param {string} seconds from the command to the first page
 */
function announce(env, ports, seconds) {
  say('');
  say(`Ready after ${seconds} s: ${env.PUBLIC_URL}`);
  if (env.FOURFOLD_MODE === 'demo') {
    say(`Demo accounts, password ${env.DEMO_PASSWORD}:`);
    for (const [email, what] of DEMO_ACCOUNTS) say(`  ${email.padEnd(28)}${what}`);
  }
  say(`Mail inbox: http://127.0.0.1:${ports.inbox}`);
  say('Ctrl-C stops everything.');
  say('');
}

async function start() {
  const ports = portsOf(NAME);
  await acquireLock(NAME, {
    wait: false,
    whenBusy: (holder) => `Fourfold already runs from this folder (process ${holder}).`,
  });
  await awaitEarlierProcesses(pidFolder);
  await assertPortsFree(NAME, ports);
  await install(NAME);
  const env = productEnvironment(ports, process.env);
  const [build] = await Promise.all([ensureBuild(), startServices(NAME, supervisor, ports, env)]);
  await migrate(env);
  await supervisor.start(workerService(build, env));
  await supervisor.start(webService(build, ports.web, env));
  const seconds = (performance.now() / 1000).toFixed(1);
  if (env.FOURFOLD_MODE === 'demo') {
    say(`Serving ${env.PUBLIC_URL} after ${seconds} s; the demo is looked after next.`);
    try {
      await seedDemo(build, ports.web, env, logToConsole);
    } catch (error) {
      say(`The demo could not be filled in; the product runs without it.\n${error instanceof Error ? error.message : error}`);
    }
  }
  announce(env, ports, seconds);
}

onInterruption(async (reason) => {
  say(`Stopping after ${reason} …`);
  await supervisor.stop();
  say('Stopped.');
}, 0);

try {
  await start();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  await supervisor.stop();
  await stopRunning();
  process.exit(1);
}
