import path from 'node:path';
import { bundle } from '../../docker/local/bundle-worker.mjs';
import { root, stateFolder } from '../../docker/local/places.mjs';

export const benchFolder = path.join(stateFolder, 'bench');

/**
 * The worker's own reading, as plain modules: what is timed is what the worker runs.
 * @returns {Promise<string>} the program, which takes a file
 */
export async function bundleReading() {
  await bundle({
    entryPoints: [
      { in: path.join(root, 'tests/bench/print-norms.ts'), out: 'print-norms' },
      { in: path.join(root, 'worker/compute/read-table-thread.ts'), out: 'read-table-thread' },
    ],
    outdir: benchFolder,
  });
  return path.join(benchFolder, 'print-norms.mjs');
}
