import path from 'node:path';
import { writeStorageConfig } from './swift-config.mjs';

/** @param {string} url */
async function answers(url) {
  try {
    const response = await fetch(url, { signal: AbortSignal.timeout(1000) });
    await response.arrayBuffer();
    return true;
  } catch {
    return false;
  }
}

/**
 * The four servers of the object store; the proxy is the one that speaks S3.
 * @param {{ folder: string, ports: import('./ports.mjs').Ports, webOrigins: string[] }} options
 * @returns {Promise<import('./supervisor.mjs').Service[]>}
 */
export async function storageServices({ folder, ports, webOrigins }) {
  await writeStorageConfig(folder, ports, webOrigins);
  const etc = path.join(folder, 'etc');
  const kinds = /** @type {const} */ ([
    ['object', ports.storageObject],
    ['container', ports.storageContainer],
    ['account', ports.storageAccount],
    ['proxy', ports.storage],
  ]);
  return kinds.map(([kind, port]) => ({
    name: kind === 'proxy' ? 'storage' : `storage-${kind}`,
    line: {
      command: `swift-${kind}-server`,
      args: [path.join(etc, `${kind}-server.conf`), '--verbose'],
      env: { ...process.env, SWIFT_DIR: etc },
    },
    // Any answer will do of the three behind it: they know nothing at their root.
    isReady: () => answers(`http://127.0.0.1:${port}/healthcheck`),
  }));
}
