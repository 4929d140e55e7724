// Runs a command of worker/commands on the local services; what is set outside goes before, so that it reaches others too.
import { spawn } from 'node:child_process';
import { productEnvironment } from './environment.mjs';
import { root } from './places.mjs';
import { portsOf } from './ports.mjs';

const [name, ...args] = process.argv.slice(2);
const env = { ...productEnvironment(portsOf('start'), process.env), ...process.env };
const child = spawn(process.execPath, ['--import', 'tsx', `worker/commands/${name}.ts`, ...args], { cwd: root, env, stdio: 'inherit' });
child.once('exit', (code) => process.exit(code ?? 1));
