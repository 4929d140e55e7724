import { open } from 'node:fs/promises';
import os from 'node:os';
import { parseArgs } from 'node:util';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { readPreview } from '@/lib/readers/read-preview';
import { openTableHelper } from '@/worker/compute/table-helper';

const readBytes = 256 * 1024;

const exact = {
  rho: '1.0 + 0.15*sin(0.75*pi*x/L) - 0.10*cos(1.00*pi*y/L) + 0.08*sin(1.25*pi*z/L)',
  u: '800.0 + 50.0*sin(1.50*pi*x/L) - 30.0*cos(0.60*pi*y/L) + 25.0*cos(0.50*pi*z/L)',
  v: '800.0 - 75.0*cos(0.50*pi*x/L) + 40.0*sin(0.667*pi*y/L) - 35.0*sin(1.30*pi*z/L)',
  w: '800.0 + 15.0*sin(0.33*pi*x/L) - 25.0*sin(1.50*pi*y/L) + 35.0*cos(1.00*pi*z/L)',
  p: '1e5 + 2e4*cos(2.00*pi*x/L) + 5e4*sin(1.00*pi*y/L) - 1e4*cos(0.33*pi*z/L)',
};

/** The file piece by piece, in room that is used again. */
async function* piecesOf(path: string): AsyncGenerator<Uint8Array> {
  const file = await open(path);
  try {
    const room = Buffer.allocUnsafe(readBytes);
    for (;;) {
      const { bytesRead } = await file.read(room, 0, readBytes);
      if (bytesRead === 0) return;
      yield room.subarray(0, bytesRead);
    }
  } finally {
    await file.close();
  }
}

function digits(value: number): string {
  const [mantissa = '', power = ''] = value.toExponential(15).split('e');
  return `${mantissa}e${power.startsWith('-') ? '-' : '+'}${power.slice(1).padStart(2, '0')}`;
}

async function printNorms(path: string, threads: number, fields: string[]): Promise<void> {
  const { header } = await readPreview(piecesOf(path));
  const reading: GridReading = {
    mapping: { x: 'x', y: 'y', z: 'z', weight: header.includes('volume') ? 'volume' : null, fields: Object.fromEntries(fields.map((field) => [field, field])) },
    problem: { dimension: 3, exact, constants: { L: 1 } },
    fields: fields.map((field) => ({ field })),
  };
  const { norms } = await readGrid(piecesOf(path), reading, { openHelper: threads > 1 ? openTableHelper : undefined });
  const h = Math.cbrt(norms.equalWeights ? 1 / norms.rows : norms.weightSum / norms.rows);
  console.log(`${path}: ${norms.rows} rows, h = ${Number(h.toPrecision(6))}`);
  for (const { field, L1, L2, Linf, at } of norms.fields) {
    console.log(`${field.padEnd(4)} ${digits(L1)} ${digits(L2)} ${digits(Linf)} at ${at.x} ${at.y} ${at.z}`);
  }
}

const { values, positionals: [path] } = parseArgs({
  allowPositionals: true, options: { threads: { type: 'string', default: String(os.availableParallelism()) }, fields: { type: 'string', default: '5' } },
});
if (path === undefined) {
  console.error('usage: npm run bench:norms -- FILE [--threads 1] [--fields 5]');
  process.exit(2);
}
await printNorms(path, Number(values.threads), Object.keys(exact).slice(0, Number(values.fields)));
