import fs from 'node:fs';
import path from 'node:path';
import { root } from './places.mjs';
import { run } from './processes.mjs';

const MOST_LINES = 300;
const MOST_LINES_TESTS = 500;
const MOST_BYTES = 1_000_000;
const SOURCE = /\.(tsx?|mjs|cjs|js|css|sql|py|sh)$/;
const GENERATED = new Set(['db/schema.generated.ts', 'lib/readers/table/table-rows.generated.ts']);
// Spelt in halves, or this file would find itself.
const SILENCED = new RegExp(['eslint-dis' + 'able', '@ts-ig' + 'nore', '@ts-exp' + 'ect-error', '\\bTO' + 'DO\\b'].join('|'));

/** @returns {Promise<string[]>} files that are, or would be, in the repository */
async function listFiles() {
  const args = ['ls-files', '--cached', '--others', '--exclude-standard', '-z'];
  const output = await run({ command: 'git', args, cwd: root });
  return output.split('\0').filter((file) => file !== '' && fs.existsSync(path.join(root, file)));
}

/** @param {string} file @returns {string[]} */
function faultsOf(file) {
  const content = fs.readFileSync(path.join(root, file));
  const faults = [];
  if (content.length > MOST_BYTES) faults.push(`${file} has ${content.length} bytes; at most ${MOST_BYTES} are allowed.`);
  if (!SOURCE.test(file) || GENERATED.has(file)) return faults;
  const lines = content.toString('utf8').split('\n');
  const most = file.startsWith('tests/') ? MOST_LINES_TESTS : MOST_LINES;
  if (lines.length - 1 > most) faults.push(`${file} has ${lines.length - 1} lines; at most ${most} are allowed.`);
  lines.forEach((line, index) => {
    const found = SILENCED.exec(line);
    if (found) faults.push(`${file}:${index + 1} holds ${found[0]}.`);
  });
  return faults;
}

/** Sizes and lengths of files, checks silenced in place, and where the lockfile sends npm. @returns {Promise<void>} */
export async function checkFiles() {
  const faults = (await listFiles()).flatMap(faultsOf);
  const lockfile = fs.readFileSync(path.join(root, 'package-lock.json'), 'utf8');
  if (/"resolved":\s*"https?:/.test(lockfile)) {
    faults.push('package-lock.json names hosts ("resolved"); .npmrc leaves them out, so install with it in place.');
  }
  if (faults.length > 0) throw new Error(faults.join('\n'));
}
