import path from 'node:path';
import { networkPorts } from './ports.mjs';
import { root } from './places.mjs';

/**
 * The network of a test run: web and worker reach the services through it, so that a test can take it from either.
 * @param {import('./ports.mjs').Ports} ports @returns {import('./supervisor.mjs').Service}
 */
export function networkService(ports) {
  const doors = networkPorts();
  const script = path.join(root, 'tests/support/network/network.mjs');
  return {
    name: 'network',
    line: { command: process.execPath, args: [script, JSON.stringify({ doors, services: ports })] },
    isReady: async () => {
      try {
        return (await fetch(`http://127.0.0.1:${doors.control}`, { signal: AbortSignal.timeout(1000) })).ok;
      } catch {
        return false;
      }
    },
  };
}

/**
 * The environment of a client whose services are behind its own doors. Browsers go straight to storage.
 * @param {Record<string, string>} env @param {'web' | 'worker'} client @returns {Record<string, string>}
 */
export function throughNetwork(env, client) {
  const doors = networkPorts()[client];
  const at = (/** @type {string} */ name, /** @type {number} */ port) => {
    const url = new URL(env[name] ?? '');
    url.port = String(port);
    return url.toString().replace(/\/$/, '');
  };
  return {
    ...env,
    DATABASE_URL: at('DATABASE_URL', doors.postgres),
    REDIS_URL: at('REDIS_URL', doors.redis),
    STORAGE_ENDPOINT: at('STORAGE_ENDPOINT', doors.storage),
    SMTP_URL: at('SMTP_URL', doors.smtp),
  };
}
