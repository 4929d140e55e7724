import fs from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { prettyLine } from './pretty-line.mjs';

const COLOURS = { fourfold: 1, web: 36, worker: 35, postgres: 34, redis: 31, mail: 32, storage: 33 };
const isColoured = Boolean(process.stdout.isTTY) && !process.env.NO_COLOR;

/** @param {string} name */
function prefixOf(name) {
  const padded = name.padEnd(9);
  const colour = COLOURS[name.split('-')[0]] ?? 90;
  return isColoured ? `\u001b[${colour}m${padded}\u001b[0m│ ` : `${padded}| `;
}

/** Prints lines of the local commands themselves. @param {string} text */
export function say(text) {
  for (const line of text.split('\n')) console.log(prefixOf('fourfold') + line);
}

/** @typedef {(name: string, stream: import('node:stream').Readable, isWorthShowing?: (line: string) => boolean) => void} LogSink */

/** Lines on the console behind the name of the process that wrote them. @type {LogSink} */
export function logToConsole(name, stream, isWorthShowing = () => true) {
  createInterface({ input: stream }).on('line', (line) => {
    if (isWorthShowing(line)) console.log(prefixOf(name) + prettyLine(line));
  });
}

/**
 * Lines into one file per process, for runs whose console belongs to something else.
 * @param {string} folder @returns {LogSink}
 */
export function logToFolder(folder) {
  fs.mkdirSync(folder, { recursive: true });
  return (name, stream) => {
    stream.pipe(fs.createWriteStream(path.join(folder, `${name}.log`), { flags: 'a' }));
  };
}
