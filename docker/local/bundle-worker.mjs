import fs from 'node:fs';
import { createRequire } from 'node:module';
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
 * Bundles entries as plain modules, as the worker is: threads cannot be started from TypeScript.
 * @param {Pick<import('esbuild').BuildOptions, 'entryPoints' | 'outbase' | 'outdir'>} options
 * @returns {Promise<string[]>} the modules it imports that it does not hold
 */
export async function bundle(options) {
  // Loaded here: this file is read before npm has installed anything.
  const { build } = await import('esbuild');
  const [mathjs, saxes] = ['mathjs', 'saxes'].map((name) => fileURLToPath(import.meta.resolve(name)));
  const { metafile } = await build({
    ...options,
    metafile: true,
    absWorkingDir: root,
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    // Of these the parsers alone instead of whole libraries: half the memory of a thread, and a third of its start.
    alias: {
      mathjs, saxes,
      '@babel/runtime/helpers/extends': createRequire(mathjs).resolve('@babel/runtime/helpers/extends'),
      xmlchars: path.dirname(createRequire(saxes).resolve('xmlchars/package.json')),
    },
    sourcemap: true,
    logLevel: 'warning',
  });
  return Object.values(metafile.outputs).flatMap(({ imports }) => imports.filter(({ external }) => external).map(({ path: name }) => name));
}

/**
 * The worker, its threads and its commands.
 * @param {string} outdir keeps the folders of worker/: main.mjs, compute/…-thread.mjs, commands/….mjs
 */
export function bundleWorker(outdir) {
  return bundle({
    entryPoints: [
      path.join(root, 'worker/main.ts'),
      ...entriesIn('worker/compute', /-thread\.ts$/),
      ...entriesIn('worker/commands', /\.ts$/),
    ],
    outbase: path.join(root, 'worker'),
    outdir,
  });
}

/** @param {string} outdir of db/migrate.mjs and migrations/….mjs */
export function bundleMigrations(outdir) {
  return bundle({ entryPoints: [path.join(root, 'db/migrate.ts'), ...entriesIn('migrations', /\.ts$/)], outbase: root, outdir });
}
