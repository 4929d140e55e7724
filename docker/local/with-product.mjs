// Runs a program beside services and a web server of their own, without a worker: it starts those it measures.
import { testEnvironment } from './environment.mjs';
import { startFreshServices, TEST_RUN, testLogFolder, testPidFolder } from './fresh-services.mjs';
import { install } from './install.mjs';
import { onInterruption } from './interruption.mjs';
import { logToFolder } from './logs.mjs';
import { root } from './places.mjs';
import { webService } from './product.mjs';
import { run, stopRunning } from './processes.mjs';
import { createSupervisor } from './supervisor.mjs';

const supervisor = createSupervisor({ pidFolder: testPidFolder, log: logToFolder(testLogFolder) });

async function runProgram() {
  const [program, ...args] = process.argv.slice(2);
  if (!program) throw new Error('Say which program.');
  await install(TEST_RUN);
  const { ports, env, build } = await startFreshServices(supervisor);
  await supervisor.start(webService(build, ports.web, env));
  await run({
    command: process.execPath,
    args: ['--import', 'tsx', program, ...args],
    cwd: root,
    env: { ...process.env, ...env, ...testEnvironment(ports), TEST_BUILD_FOLDER: build, TEST_LOG_FOLDER: testLogFolder },
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
