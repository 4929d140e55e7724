import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { root } from './places.mjs';

/** @param {string} folder @param {RegExp} name */
function entriesIn(folder, name) {
  const place = path.join(root, folder);
  if (!fs.existsSync(place)) return [];
  return fs.readdirSync(place).flatMap((file) => (name.test(file) ? [path.join(place, file)] : []));
}

/**
 * The worker, its threads and its commands as plain modules: threads cannot be started from TypeScript.
 * @param {string} outdir keeps the folders of worker/: main.mjs, compute/…-thread.mjs, commands/….mjs
 */
export async function bundleWorker(outdir) {
  // Loaded here: this file is read before npm has installed anything.
  const { build } = await import('esbuild');
  await build({
    absWorkingDir: root,
    entryPoints: [
      path.join(root, 'worker/main.ts'),
      ...entriesIn('worker/compute', /-thread\.ts$/),
      ...entriesIn('worker/commands', /\.ts$/),
    ],
    outbase: path.join(root, 'worker'),
    outdir,
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    // The parser alone instead of the whole library: half the memory of a thread.
    alias: { mathjs: fileURLToPath(import.meta.resolve('mathjs')) },
    sourcemap: true,
    logLevel: 'warning',
  });
}
