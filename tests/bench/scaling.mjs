// What reading costs by rows and by fields: npm run bench:scaling -- [--runs 5] [--scattered] [--large 10]
// With --large the largest table is read as so many copies one after another, in a file that is deleted again.
import fs from 'node:fs';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { benchFolder, bundleReading } from './bundle.mjs';
import { generatedTable } from './tables.mjs';
import { median, timedRun } from './timed-run.mjs';

const { values: options } = parseArgs({
  options: { runs: { type: 'string', default: '5' }, scattered: { type: 'boolean', default: false }, large: { type: 'string' } },
});
const runs = Number(options.runs);
const program = [process.execPath, await bundleReading()];
const table = (/** @type {number} */ cells) => generatedTable(cells, { isScattered: options.scattered });

/** @param {string} what @param {string} file @param {string[]} more @param {number} count */
async function measure(what, file, more, count) {
  const all = [];
  for (let run = 0; run < count; run += 1) all.push(await timedRun([...program, file, ...more]));
  const seconds = median(all.map((run) => run.seconds));
  const rows = Number(/: (\d+) rows/.exec(all[0]?.output ?? '')?.[1]);
  const megabytes = Math.max(...all.map((run) => run.megabytes));
  console.log(
    `${what.padEnd(22)} ${String(rows).padStart(9)} rows  ${seconds.toFixed(3).padStart(7)} s  ${((seconds / rows) * 1e9).toFixed(0).padStart(6)} ns a row  ` +
      `${(fs.statSync(file).size / 1e6 / seconds).toFixed(0).padStart(5)} MB a second  ${megabytes.toFixed(0).padStart(4)} MB of memory at most`,
  );
}

/** @param {string} file @param {number} copies of its rows, behind one header */
function repeated(file, copies) {
  const target = path.join(benchFolder, `repeated-${copies}.csv`);
  const content = fs.openSync(file, 'r');
  const room = Buffer.alloc(8 * 1024 * 1024);
  const written = fs.openSync(target, 'w');
  for (let copy = 0; copy < copies; copy += 1) {
    let isFirst = true;
    for (let at = 0, count = 0; (count = fs.readSync(content, room, 0, room.length, at)) > 0; at += count) {
      fs.writeSync(written, room, isFirst && copy > 0 ? room.indexOf(10) + 1 : 0, count - (isFirst && copy > 0 ? room.indexOf(10) + 1 : 0));
      isFirst = false;
    }
  }
  fs.closeSync(content);
  fs.closeSync(written);
  return target;
}

for (const cells of [64, 100, 160]) await measure(`5 fields, ${cells} cells`, table(cells), [], runs);
for (const fields of [1, 3, 5]) await measure(`${fields} fields, 100 cells`, table(100), ['--fields', String(fields)], runs);
if (options.large !== undefined) {
  const file = repeated(table(160), Number(options.large));
  try {
    await measure(`${options.large} × 160 cells`, file, [], 1);
    await measure('  in one thread', file, ['--threads', '1'], 1);
  } finally {
    fs.rmSync(file);
  }
}
