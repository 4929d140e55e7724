import { spawnSync } from 'node:child_process';
import fs from 'node:fs';

/** Debian package → a file that shows it is there. */
const SERVICES = {
  'postgresql-15': '/usr/lib/postgresql/15/bin/postgres',
  'redis-server': '/usr/bin/redis-server',
  'swift-proxy': '/usr/bin/swift-proxy-server',
  'swift-object': '/usr/bin/swift-object-server',
  'swift-container': '/usr/bin/swift-container-server',
  'swift-account': '/usr/bin/swift-account-server',
};
const DATABASE = { 'postgresql-15': SERVICES['postgresql-15'] };
const BROWSER = { chromium: '/usr/bin/chromium' };

const NEEDS = { start: SERVICES, test: { ...SERVICES, ...BROWSER }, validate: DATABASE };

const APT_GET = '/usr/bin/apt-get';
const POLICY = '/usr/sbin/policy-rc.d';
const CLUSTER_SETTINGS = '/etc/postgresql-common/createcluster.d';

/** @param {string[]} args */
function aptGet(args) {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const options = ['-o', 'DPkg::Lock::Timeout=600', '-o', 'Dpkg::Options::=--force-confold'];
  const { status, error } = spawnSync(APT_GET, [...options, ...args], { stdio: 'inherit', env });
  if (error) throw error;
  if (status !== 0) throw new Error(`apt-get ${args.join(' ')} ended with status ${status}.`);
}

function hasPackageLists() {
  const folder = '/var/lib/apt/lists';
  return fs.existsSync(folder) && fs.readdirSync(folder).some((name) => /_Packages(\.\w+)?$/.test(name));
}

/**
 * Installing a server on Debian starts it, and makes a database cluster, on the very ports somebody may use; the
 * product runs its own.
 * @param {() => void} work
 */
function withoutStartingServices(work) {
  const addsPolicy = !fs.existsSync(POLICY);
  if (addsPolicy) fs.writeFileSync(POLICY, '#!/bin/sh\nexit 101\n', { mode: 0o755 });
  fs.mkdirSync(CLUSTER_SETTINGS, { recursive: true });
  const settings = `${CLUSTER_SETTINGS}/fourfold.conf`;
  fs.writeFileSync(settings, 'create_main_cluster = false\n');
  try {
    work();
  } finally {
    fs.rmSync(settings, { force: true });
    if (addsPolicy) fs.rmSync(POLICY, { force: true });
  }
}

/** Installs the Debian packages a run needs, or says which command would. @param {import('./ports.mjs').RunName} name */
export function ensurePackages(name) {
  const missing = Object.entries(NEEDS[name]).flatMap(([packageName, file]) =>
    fs.existsSync(file) ? [] : [packageName],
  );
  if (missing.length === 0) return;
  const install = ['install', '-y', '--no-install-recommends', ...missing];
  if (process.getuid?.() !== 0 || !fs.existsSync(APT_GET)) {
    throw new Error(
      `These Debian packages are missing: ${missing.join(', ')}.\n` +
        `Install them with: sudo apt-get update && sudo apt-get ${install.join(' ')}`,
    );
  }
  console.log(`Installing ${missing.join(', ')} …`);
  withoutStartingServices(() => {
    if (!hasPackageLists()) aptGet(['update']);
    try {
      aptGet(install);
    } catch (error) {
      console.log(`${error instanceof Error ? error.message : error} The package lists may be old: fetching them anew …`);
      aptGet(['update']);
      aptGet(install);
    }
  });
}
