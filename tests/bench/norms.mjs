// Norms of a table by the worker's own reading: npm run bench:norms -- FILE [--threads 1] [--fields 5]
import { spawnSync } from 'node:child_process';
import { bundleReading } from './bundle.mjs';

const { status } = spawnSync(process.execPath, [await bundleReading(), ...process.argv.slice(2)], { stdio: 'inherit' });
process.exit(status ?? 1);
