import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { run } from './processes.mjs';

export const STORAGE_ACCOUNT = 'fourfold';
export const STORAGE_USER = 'app';
export const STORAGE_SECRET = 'fourfold-local';

/** @typedef {Pick<import('./ports.mjs').Ports, 'storage' | 'storageObject' | 'storageContainer' | 'storageAccount'>} StoragePorts */

/** @param {Record<string, Record<string, string | number>>} sections */
function ini(sections) {
  return Object.entries(sections)
    .map(([section, values]) => {
      const lines = Object.entries(values).map(([key, value]) => `${key} = ${value}`);
      return [`[${section}]`, ...lines, ''].join('\n');
    })
    .join('\n');
}

/** @param {number} port @param {string} folder */
const server = (port, folder) => ({
  bind_ip: '127.0.0.1',
  bind_port: port,
  user: os.userInfo().username,
  swift_dir: path.join(folder, 'etc'),
  devices: path.join(folder, 'devices'),
  mount_check: 'false',
  workers: 0,
  disable_fallocate: 'true',
  log_level: 'ERROR',
});

/** @param {StoragePorts} ports @param {string} folder @param {string[]} webOrigins */
function proxyConfig(ports, folder, webOrigins) {
  const pipeline =
    'catch_errors gatekeeper healthcheck cache listing_formats bulk s3api tempauth copy slo dlo versioned_writes proxy-server';
  const origins = webOrigins.join(', ');
  return ini({
    DEFAULT: {
      ...server(ports.storage, folder),
      cors_allow_origin: origins,
      cors_expose_headers: 'ETag',
      strict_cors_mode: 'true',
    },
    'pipeline:main': { pipeline },
    'app:proxy-server': {
      use: 'egg:swift#proxy',
      account_autocreate: 'true',
      allow_account_management: 'true',
      // There is no other server to turn to: one that was away is asked again at once, not after a minute.
      error_suppression_interval: '0',
      error_suppression_limit: 1_000_000,
    },
    'filter:s3api': { use: 'egg:swift#s3api', location: 'us-east-1', cors_preflight_allow_origin: origins },
    'filter:tempauth': {
      use: 'egg:swift#tempauth',
      [`user_${STORAGE_ACCOUNT}_${STORAGE_USER}`]: `${STORAGE_SECRET} .admin`,
    },
    // The filter must be there; nothing listens at its address, so two stores never share what one remembers.
    'filter:cache': { use: 'egg:swift#memcache', memcache_servers: '127.0.0.1:1', 'set log_level': 'CRITICAL' },
    ...Object.fromEntries(
      ['catch_errors', 'gatekeeper', 'healthcheck', 'listing_formats', 'bulk', 'copy', 'slo', 'dlo', 'versioned_writes'].map(
        (name) => [`filter:${name}`, { use: `egg:swift#${name}` }],
      ),
    ),
  });
}

/** @param {string} etc @param {string} kind @param {number} port */
async function buildRing(etc, kind, port) {
  const builder = path.join(etc, `${kind}.builder`);
  for (const args of [['create', '4', '1', '1'], ['add', `r1z1-127.0.0.1:${port}/d1`, '1'], ['rebalance']]) {
    await run({ command: 'swift-ring-builder', args: [builder, ...args] });
  }
}

/**
 * Writes what the store's four servers read. A ring holds its port, so rings are built again when ports change; with
 * one device the places of objects stay the same.
 * @param {string} folder @param {StoragePorts} ports @param {string[]} webOrigins
 */
export async function writeStorageConfig(folder, ports, webOrigins) {
  const etc = path.join(folder, 'etc');
  fs.mkdirSync(path.join(folder, 'devices/d1'), { recursive: true });
  const kinds = { object: ports.storageObject, container: ports.storageContainer, account: ports.storageAccount };
  const ringsFile = path.join(etc, 'rings.json');
  const wanted = JSON.stringify(kinds);
  if (!fs.existsSync(ringsFile) || fs.readFileSync(ringsFile, 'utf8') !== wanted) {
    fs.rmSync(etc, { recursive: true, force: true });
    fs.mkdirSync(etc, { recursive: true });
    await Promise.all(Object.entries(kinds).map(([kind, port]) => buildRing(etc, kind, port)));
    fs.writeFileSync(ringsFile, wanted);
  }
  fs.writeFileSync(
    path.join(etc, 'swift.conf'),
    ini({
      'swift-hash': { swift_hash_path_prefix: 'fourfold', swift_hash_path_suffix: 'local' },
      'storage-policy:0': { name: 'default', default: 'yes' },
    }),
  );
  for (const [kind, port] of Object.entries(kinds)) {
    fs.writeFileSync(
      path.join(etc, `${kind}-server.conf`),
      ini({
        DEFAULT: server(port, folder),
        'pipeline:main': { pipeline: `${kind}-server` },
        [`app:${kind}-server`]: { use: `egg:swift#${kind}` },
      }),
    );
  }
  fs.writeFileSync(path.join(etc, 'proxy-server.conf'), proxyConfig(ports, folder, webOrigins));
}
