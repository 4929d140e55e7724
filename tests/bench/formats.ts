// What reading takes of files of other formats than text tables: npm run bench:formats -- 2500000
import { spawnSync } from 'node:child_process';
import { createReadStream, createWriteStream, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { readGrid } from '@/lib/readers/read-grid';
import { writeHdf5 } from '@/tests/support/hdf5';

const rows = Number(process.argv[2] ?? 2_500_000);
const values: Readonly<Record<string, (row: number) => number>> = { x: (row) => row / rows, w: () => 1 / rows, u: Math.sin, v: (row) => row * 1e-3 };
const names = Object.keys(values);
const valueOf = (name: string, row: number) => values[name]?.(row) ?? 0;

function* columnsOf(separator: string, open: (name: string) => string, close: string): Generator<string> {
  for (const name of names) {
    yield open(name);
    for (let row = 0; row < rows; row += 1) yield `${row === 0 ? '' : separator}${valueOf(name, row)}`;
    yield name === names.at(-1) ? close : `${close},`;
  }
}
function* jsonColumns(): Generator<string> {
  yield '{';
  yield* columnsOf(',', (name) => `"${name}":[`, ']');
  yield '}';
}
function* jsonRecords(): Generator<string> {
  for (let row = 0; row < rows; row += 1) yield `${row === 0 ? '[' : ',\n'}{${names.map((name) => `"${name}":${valueOf(name, row)}`).join()}}`;
  yield ']';
}
function* hdf5Json(): Generator<string> {
  yield '{"datasets":{';
  yield* columnsOf(',', (name) => `"${name}":{"alias":["/${name}"],"type":{"class":"H5T_FLOAT","base":"H5T_IEEE_F64LE"},"shape":{"class":"H5S_SIMPLE","dims":[${rows}]},"value":[`, ']}');
  yield '}}';
}
/** In pieces, since a write for each number would take longer than reading. */
function* together(parts: Iterable<string>): Generator<string> {
  let piece = '';
  for (const part of parts) {
    piece += part;
    if (piece.length > 1e6) {
      yield piece;
      piece = '';
    }
  }
  yield piece;
}

const folder = path.join(os.tmpdir(), `formats-${process.pid}`);
const place = (name: string) => path.join(folder, name);
const hdf5 = async (name: string, layout: { chunks?: number[]; compression?: number }) => {
  const data = (column: string) => Float64Array.from({ length: rows }, (_, row) => valueOf(column, row));
  writeFileSync(place(name), await writeHdf5(names.map((column) => ({ path: column, data: data(column), ...layout }))));
};

/** In a process of its own, whose memory is that of reading. */
function timeReading(name: string): void {
  const { status } = spawnSync(process.execPath, ['--import', 'tsx', import.meta.filename, String(rows), place(name)], { stdio: 'inherit' });
  if (status !== 0) throw new Error(`Reading ${name} ended with status ${status}.`);
}

async function readOne(file: string): Promise<void> {
  const begun = performance.now();
  const { norms, bytes } = await readGrid(createReadStream(file, { highWaterMark: 256 * 1024 }), {
    mapping: { x: 'x', weight: 'w', fields: { u: 'u', v: 'v' } }, problem: { dimension: 1, exact: { u: 'sin(x)', v: 'x' }, constants: {} }, fields: [{ field: 'u' }, { field: 'v' }],
  });
  const seconds = (performance.now() - begun) / 1000;
  console.log(`${path.basename(file).padEnd(18)} ${norms.rows} rows, ${(bytes / 1e6).toFixed(0)} MB in ${seconds.toFixed(2)} s: ${(norms.rows / seconds / 1e6).toFixed(2)} million rows/s, ${(bytes / 1e6 / seconds).toFixed(0)} MB/s, at most ${(process.resourceUsage().maxRSS / 1e3).toFixed(0)} MB`);
}

async function writeAndRead(): Promise<void> {
  mkdirSync(folder);
  try {
    for (const [name, parts] of Object.entries({ 'columns.json': jsonColumns, 'records.json': jsonRecords, 'hdf5.json': hdf5Json })) {
      await pipeline(Readable.from(together(parts())), createWriteStream(place(name)));
      timeReading(name);
    }
    for (const [name, layout] of Object.entries({ 'plain.h5': {}, 'packed.h5': { chunks: [16_384], compression: 4 }, 'one-chunk.h5': { chunks: [rows], compression: 4 } })) {
      await hdf5(name, layout);
      timeReading(name);
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const [,, , given] = process.argv;
await (given === undefined ? writeAndRead() : readOne(given));
