import fs from 'node:fs';
import path from 'node:path';
import { testEnvironment } from './environment.mjs';
import { startFreshServices, TEST_RUN, testLogFolder, testPidFolder, testReportFolder } from './fresh-services.mjs';
import { install } from './install.mjs';
import { onInterruption } from './interruption.mjs';
import { logToFolder } from './logs.mjs';
import { npmBinary, root } from './places.mjs';
import { networkPorts } from './ports.mjs';
import { webService, workerService } from './product.mjs';
import { run, stopRunning } from './processes.mjs';
import { createSupervisor } from './supervisor.mjs';
import { readCounts } from './test-counts.mjs';
import { networkService, throughNetwork } from './test-network.mjs';
import { needsProduct } from './test-selection.mjs';

// What tests kill again and again comes back quickly every time.
const supervisor = createSupervisor({ pidFolder: testPidFolder, log: logToFolder(testLogFolder), longestBackoff: 500 });

/** @returns {Promise<Record<string, string>>} what the tests need to know */
async function startProduct() {
  const { ports, env, build } = await startFreshServices(supervisor);
  await supervisor.start(networkService(ports));
  await supervisor.start(workerService(build, throughNetwork(env, 'worker')));
  await supervisor.start(webService(build, ports.web, throughNetwork(env, 'web')));
  console.log(`The product runs for the tests on port ${ports.web} after ${performance.now().toFixed(0)} ms.`);
  return {
    ...env, ...testEnvironment(ports), TEST_BUILD_FOLDER: build, TEST_PID_FOLDER: testPidFolder, TEST_LOG_FOLDER: testLogFolder,
    TEST_NETWORK_URL: `http://127.0.0.1:${networkPorts().control}`,
  };
}

/** @param {string[]} args @param {Record<string, string>} env */
async function runVitest(args, env) {
  const report = path.join(testReportFolder, `${process.pid}.json`);
  fs.rmSync(report, { force: true });
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  let endedWell = true;
  try {
    await run({
      command: npmBinary('vitest'),
      args: ['run', ...reporters, ...args],
      cwd: root,
      env: { ...process.env, ...env, ...(process.stdout.isTTY ? { FORCE_COLOR: '1' } : {}) },
      onOutput: (text) => process.stdout.write(text),
    });
  } catch (error) {
    endedWell = false;
    console.log(error instanceof Error ? error.message : error);
  }
  const counts = readCounts(report, endedWell);
  fs.rmSync(report, { force: true });
  return counts;
}

function printLogs() {
  for (const name of fs.existsSync(testLogFolder) ? fs.readdirSync(testLogFolder) : []) {
    const lines = fs.readFileSync(path.join(testLogFolder, name), 'utf8').trim().split('\n').slice(-20);
    if (lines.join('') !== '') console.log(`The last lines of ${name}:\n${lines.join('\n')}`);
  }
}

async function test() {
  const args = process.argv.slice(2);
  try {
    await install(needsProduct(args) ? TEST_RUN : null);
    const env = needsProduct(args) ? await startProduct() : {};
    return await runVitest(args, env);
  } catch (error) {
    printLogs();
    console.log(error instanceof Error ? error.message : error);
    return { passed: 0, failed: 1 };
  } finally {
    await supervisor.stop();
    await stopRunning();
  }
}

onInterruption(async (reason) => {
  console.log(`Stopping after ${reason} …`);
  await supervisor.stop();
}, null);

const { passed, failed } = await test();
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
