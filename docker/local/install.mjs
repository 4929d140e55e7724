import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { withLock } from './lock.mjs';
import { ensurePackages } from './packages.mjs';
import { root } from './places.mjs';
import { run } from './processes.mjs';

const lockfile = path.join(root, 'package-lock.json');
const record = path.join(root, 'node_modules/.fourfold-lockfile');
const installed = path.join(root, 'node_modules/.package-lock.json');

/**
 * Somebody who ran npm by hand has the right packages without our record.
 * @param {string} text of the lockfile
 */
function isInstalledAsLocked(text) {
  if (!fs.existsSync(installed)) return false;
  const wanted = JSON.parse(text).packages;
  const present = JSON.parse(fs.readFileSync(installed, 'utf8')).packages;
  const isSame = (/** @type {string} */ key) =>
    wanted[key]?.version === present[key]?.version && wanted[key]?.integrity === present[key]?.integrity;
  return (
    Object.keys(present).every(isSame) &&
    Object.keys(wanted).every((key) => key === '' || wanted[key].optional || present[key] !== undefined)
  );
}

async function ensureNodeModules() {
  const text = fs.readFileSync(lockfile, 'utf8');
  const hash = createHash('sha256').update(text).digest('hex');
  if (fs.existsSync(record) && fs.readFileSync(record, 'utf8') === hash) return;
  if (!isInstalledAsLocked(text)) {
    console.log('Installing npm packages …');
    await run({
      command: 'npm',
      args: ['ci', '--no-fund', '--no-audit'],
      cwd: root,
      // Development packages are wanted whatever the shell says: the build and the mail inbox need them.
      env: { ...process.env, NODE_ENV: 'development' },
      onOutput: (output) => process.stdout.write(output),
    });
  }
  fs.writeFileSync(record, hash);
}

/**
 * Debian's and npm's packages. A start and a test run may begin at the same moment in a clean clone: one installs, the
 * other waits.
 * @param {import('./ports.mjs').RunName | null} name of the run that needs Debian's packages, null for none of them
 */
export async function install(name) {
  await withLock('install', 'packages being installed', async () => {
    if (name) ensurePackages(name);
    await ensureNodeModules();
  });
}
