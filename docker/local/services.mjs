import fs from 'node:fs';
import path from 'node:path';
import { ensureBucket } from './bucket.mjs';
import { webOrigins } from './environment.mjs';
import { mailService } from './mail.mjs';
import { stateFolder } from './places.mjs';
import { applyRoles, postgresService } from './postgres.mjs';
import { redisService } from './redis.mjs';
import { storageServices } from './swift.mjs';

/** @typedef {import('./ports.mjs').RunName} RunName */

/** @param {RunName} name */
export const runFolder = (name) => path.join(stateFolder, name);

/** @param {RunName} name @param {import('./supervisor.mjs').Supervisor} supervisor @param {number} port */
export async function startDatabase(name, supervisor, port) {
  const folder = path.join(runFolder(name), 'postgres');
  await supervisor.start(await postgresService({ folder, port, isLasting: name === 'start' }));
  await applyRoles(port);
}

/**
 * Starts every service and makes it fit to use: roles, database, bucket.
 * @param {RunName} name @param {import('./supervisor.mjs').Supervisor} supervisor
 * @param {import('./ports.mjs').Ports} ports @param {Record<string, string>} env
 */
export async function startServices(name, supervisor, ports, env) {
  const folder = runFolder(name);
  fs.mkdirSync(folder, { recursive: true });
  const startStorage = async () => {
    const services = await storageServices({
      folder: path.join(folder, 'storage'),
      ports,
      webOrigins: [...new Set([...webOrigins(ports.web), new URL(env.PUBLIC_URL ?? '').origin])],
    });
    await Promise.all(services.map((service) => supervisor.start(service)));
    await ensureBucket(env);
  };
  const mail = { folder: path.join(folder, 'mail'), smtpPort: ports.smtp, inboxPort: ports.inbox };
  await Promise.all([
    startDatabase(name, supervisor, ports.postgres),
    supervisor.start(redisService({ folder: path.join(folder, 'redis'), port: ports.redis })),
    startStorage(),
    supervisor.start(mailService(mail)),
  ]);
}
