// Seeded schedules of faults: npm run test:faults [-- --seed N], npm run soak:faults [-- --schedules N].
import { spawn } from 'node:child_process';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { root } from './places.mjs';

const SOAK = 5000;
const [kind, ...args] = process.argv.slice(2);
const { values } = parseArgs({ args, options: { seed: { type: 'string' }, schedules: { type: 'string' } } });
const schedules = values.schedules ?? (kind === 'soak' ? SOAK : kind);
// A soak looks where nobody has looked; the rest looks where it looked before.
const base = kind === 'soak' ? Math.floor(Math.random() * 1e9) : 1;
/** @type {Record<string, string>} */
const env = values.seed === undefined ? { FAULT_SCHEDULES: String(schedules), FAULT_BASE: String(base) } : { FAULT_SEED: values.seed };
console.log(values.seed === undefined ? `${schedules} schedules from seed ${base} on.` : `Seed ${values.seed}.`);
const script = path.join(root, 'docker/local/test.mjs');
const child = spawn(process.execPath, [script, 'tests/faults/schedules.test.ts'], { cwd: root, env: { ...process.env, ...env }, stdio: 'inherit' });
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM'])) process.on(signal, () => child.kill(signal));
child.once('exit', (code) => process.exit(code ?? 1));
