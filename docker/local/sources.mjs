import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { root } from './places.mjs';

const FOLDERS = ['app', 'lib', 'db', 'worker', 'public'];
/** What is loaded before the web server. */
export const startFiles = ['web-start.mjs', 'peer-address.mjs', 'draining.mjs', 'request-record.mjs', 'slow-clients.mjs'];
// Root files that no build reads, or that the build itself writes.
const NOT_BUILT = new Set(['vitest.config.ts', 'eslint.config.mjs', 'knip.json', 'next-env.d.ts']);

/** @param {string} folder @returns {string[]} */
function filesBelow(folder) {
  if (!fs.existsSync(folder)) return [];
  const entries = fs.readdirSync(folder, { withFileTypes: true, recursive: true });
  return entries.filter((entry) => entry.isFile()).map((entry) => path.join(entry.parentPath ?? entry.path, entry.name));
}

/** A name for exactly these sources: what a build reads, and how it is built. @returns {string} */
export function hashSources() {
  const atRoot = fs
    .readdirSync(root)
    .filter((name) => /\.(ts|mjs|json)$/.test(name) && !NOT_BUILT.has(name))
    .map((name) => path.join(root, name));
  const builder = [...startFiles, 'local/build.mjs', 'local/bundle-worker.mjs'].map((name) =>
    path.join(root, 'docker', name),
  );
  const files = [...atRoot, ...builder, ...FOLDERS.flatMap((name) => filesBelow(path.join(root, name)))];
  const hash = createHash('sha256');
  for (const file of files.sort()) {
    const content = fs.readFileSync(file);
    hash.update(`${path.relative(root, file)}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex').slice(0, 16);
}
