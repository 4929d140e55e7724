// Times the worker's reading against other programs in pairs: npm run bench -- [FILE …] [--cells 160] [--pairs 5] [--with "PROGRAM …"]
// A program is given the file and prints norms as print-norms.ts does. Without a FILE two are generated, once. Ours are
// compared with sums rounded once, of the C library's sines; how far the other program is from these is printed too.
import fs from 'node:fs';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { benchFolder, bundleReading } from './bundle.mjs';
import { generatedTable, kept, python, script } from './tables.mjs';
import { median, timedRun } from './timed-run.mjs';

/** Relative to each norm. */
const agreement = 1e-12;
const { values: options, positionals } = parseArgs({
  allowPositionals: true,
  options: { cells: { type: 'string', default: '160' }, pairs: { type: 'string', default: '5' }, with: { type: 'string', multiple: true, default: [] } },
});
const pairs = Number(options.pairs);
/** @param {string} output @returns {number[]} the norms in it */
const normsOf = (output) => output.split('\n').slice(1).flatMap((line) => line.split(/\s+/).slice(1, 4).filter(Boolean).map(Number));

/** The largest difference between two answers, by the size of each norm. @param {string} one @param {string} other */
function difference(one, other) {
  const [a, b] = [normsOf(one), normsOf(other)];
  if (a.length === 0 || a.length !== b.length) return Infinity;
  return Math.max(...a.map((norm, at) => Math.abs(norm - b[at]) / Math.abs(norm)));
}

/** @param {number} apart */
const within = (apart) => apart.toExponential(1);

/**
 * @param {{ name: string, ours: string[], peer: string[], rows: number, bytes: number, exact: string }} pair
 */
async function race({ name, ours, peer, rows, bytes, exact }) {
  const runs = [];
  for (let pair = 0; pair < pairs; pair += 1) runs.push({ our: await timedRun(ours), their: await timedRun(peer) });
  const [our, their] = [median(runs.map((run) => run.our.seconds)), median(runs.map((run) => run.their.seconds))];
  const apart = (/** @type {'our' | 'their'} */ who) => Math.max(...runs.map((run) => difference(exact, run[who].output)));
  const memory = (/** @type {'our' | 'their'} */ who) => Math.max(...runs.map((run) => run[who].megabytes)).toFixed(0);
  console.log(
    `${name.padEnd(34)} ours ${our.toFixed(2)} s ${memory('our')} MB  ${name.split(' ')[0]} ${their.toFixed(2)} s ${memory('their')} MB  ratio ${(their / our).toFixed(2)}` +
      `  (${(rows / our / 1e6).toFixed(2)} million rows, ${(bytes / our / 1e6).toFixed(0)} MB a second; of the exact norms ours are within ${within(apart('our'))}, theirs ${within(apart('their'))})`,
  );
  if (!(apart('our') <= agreement)) process.exitCode = 1;
}

fs.mkdirSync(benchFolder, { recursive: true });
const program = [process.execPath, await bundleReading()];
const cells = Number(options.cells);
for (const file of positionals.length > 0 ? positionals : [generatedTable(cells), generatedTable(cells, { isScattered: true })]) {
  const bytes = fs.statSync(file).size;
  const { output } = await timedRun([...program, file]);
  const exact = fs.readFileSync(kept(`${path.basename(file)}-${bytes}.exact`, `'${python}' '${script('norms_pandas.py')}' '${file}' round_trip exact`), 'utf8');
  const rows = Number(/: (\d+) rows/.exec(output)?.[1]);
  console.log(`${file}: ${rows} rows, ${(bytes / 1e6).toFixed(0)} MB, ${pairs} pairs`);
  const against = (/** @type {string} */ name, /** @type {string[]} */ peer) => race({ name, ours: [...program, file], peer, rows, bytes, exact });
  await against('pandas', [python, script('norms_pandas.py'), file]);
  await against('pandas round_trip', [python, script('norms_pandas.py'), file, 'round_trip']);
  for (const given of options.with) await against(given, [...given.split(' '), file]);
  const packed = kept(`${path.basename(file)}-${bytes}.gz`, `gzip -1 -c '${file}'`);
  await race({ name: 'gzip, one thread each', ours: [...program, file, '--threads', '1'], peer: [...program, packed, '--threads', '1'], rows, bytes, exact });
}
