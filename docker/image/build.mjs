// What the images hold, in one folder each: web, worker (with migrations and commands), mail.
import fs from 'node:fs';
import path from 'node:path';
import { buildInto } from '../local/build.mjs';
import { bundleMigrations, bundleWorker } from '../local/bundle-worker.mjs';
import { root } from '../local/places.mjs';
import { copyModules } from './copy-modules.mjs';

const [target] = process.argv.slice(2);
if (!target) throw new Error('Say where to: node docker/image/build.mjs FOLDER');

/** @param {string} from below the repository @param {string} to below the folder */
const copy = (from, to) => fs.cpSync(path.join(root, from), path.join(target, to), { recursive: true });

await buildInto(target);
const worker = path.join(target, 'worker');
const imported = [...(await bundleWorker(worker)), ...(await bundleMigrations(worker))];
// h5wasm is imported by where it lies, which a bundler does not see.
copyModules([...imported, 'h5wasm'], worker);
copy('docker/image/make-bucket.mjs', 'worker/image/make-bucket.mjs');
copy('docker/local/bucket.mjs', 'worker/local/bucket.mjs');
copy('docker/image/health.mjs', 'worker/health.mjs');
copy('docker/image/health.mjs', 'web/health.mjs');

const mail = path.join(target, 'mail');
for (const name of ['mail-server.mjs', 'mail-store.mjs', 'mail-pages.mjs']) copy(`docker/local/${name}`, `mail/${name}`);
copyModules(['smtp-server', 'mailparser'], mail);
