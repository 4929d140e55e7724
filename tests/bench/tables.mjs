import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { root } from '../../docker/local/places.mjs';
import { benchFolder } from './bundle.mjs';

/** Where Debian installs python3-pandas. */
export const python = process.env.BENCH_PYTHON ?? '/usr/bin/python3';

/** @param {string} name */
export const script = (name) => path.join(root, 'tests/bench', name);

/**
 * A file that is made once and kept.
 * @param {string} name @param {string} command for a shell, whose output the file is
 */
export function kept(name, command) {
  fs.mkdirSync(benchFolder, { recursive: true });
  const file = path.join(benchFolder, name);
  if (!fs.existsSync(file)) {
    console.log(`Writing ${file} …`);
    execFileSync('sh', ['-c', `${command} > '${file}.part' && mv '${file}.part' '${file}'`], { stdio: 'inherit' });
  }
  return file;
}

/** @param {number} cells per direction */
export function generatedTable(cells, { isScattered = false } = {}) {
  const name = `${isScattered ? 'scattered' : 'structured'}-${cells}.csv`;
  return kept(name, `'${process.execPath}' '${script('generate.mjs')}' ${cells} ${isScattered ? '--scattered' : ''}`);
}
