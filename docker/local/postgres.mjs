import fs from 'node:fs';
import path from 'node:path';
import { root } from './places.mjs';
import { run } from './processes.mjs';

const BINARIES = '/usr/lib/postgresql/15/bin';
/** @param {string} name */
const binary = (name) => path.join(BINARIES, name);

/**
 * PostgreSQL refuses to run as root; in a user namespace of its own it sees an ordinary user, and files keep their
 * owner.
 */
const asOrdinaryUser =
  process.getuid?.() === 0 ? ['unshare', '--user', '--map-user=1000', '--map-group=1000', '--'] : [];

/** @param {string} folder */
async function createCluster(folder) {
  // initdb leaves a half-made folder when interrupted; made beside and renamed, it is whole or not there.
  const unfinished = `${folder}.unfinished`;
  fs.rmSync(unfinished, { recursive: true, force: true });
  const settings = ['-U', 'postgres', '-A', 'trust', '-E', 'UTF8', '--locale=C.UTF-8', '--no-sync'];
  try {
    await run({ before: asOrdinaryUser, command: binary('initdb'), args: ['-D', unfinished, ...settings] });
  } catch (error) {
    if (!/unshare/.test(String(error))) throw error;
    throw new Error(
      'PostgreSQL does not run as root, and user namespaces are not allowed here. Run the command as an ordinary user.',
      { cause: error },
    );
  }
  fs.renameSync(unfinished, folder);
}

/** A file left by a killed server stops the next one when its process id has come to belong to another program. */
function dropStaleProcessFile(/** @type {string} */ folder) {
  const file = path.join(folder, 'postmaster.pid');
  if (!fs.existsSync(file)) return;
  const pid = fs.readFileSync(file, 'utf8').split('\n')[0] ?? '';
  let commandLine = '';
  try {
    commandLine = fs.readFileSync(`/proc/${pid}/cmdline`, 'utf8');
  } catch {
    commandLine = '';
  }
  if (!commandLine.includes(folder)) fs.rmSync(file, { force: true });
}

/**
 * @param {{ folder: string, port: number, isLasting: boolean }} options data that is thrown away after the run need
 *   not survive a power cut
 * @returns {Promise<import('./supervisor.mjs').Service>}
 */
export async function postgresService({ folder, port, isLasting }) {
  if (!fs.existsSync(folder)) await createCluster(folder);
  const settings = [
    'listen_addresses=127.0.0.1',
    'unix_socket_directories=',
    'log_line_prefix=',
    'log_checkpoints=off',
    'shared_buffers=64MB',
    `fsync=${isLasting ? 'on' : 'off'}`,
    'log_min_messages=fatal',
  ];
  return {
    name: 'postgres',
    isWorthShowing: (line) => !/the database system is starting up/.test(line),
    beforeStart: () => dropStaleProcessFile(folder),
    line: {
      before: asOrdinaryUser,
      deathSignal: 'INT',
      command: binary('postgres'),
      args: ['-D', folder, '-p', String(port), ...settings.flatMap((setting) => ['-c', setting])],
    },
    stopSignal: 'SIGINT',
    isReady: async () => {
      try {
        await run({ command: binary('pg_isready'), args: ['-q', '-U', 'postgres', '-h', '127.0.0.1', '-p', String(port)] });
        const answer = await psql(port, ['-tAc', 'select 1']);
        return answer.trim() === '1';
      } catch {
        return false;
      }
    },
  };
}

/** @param {number} port @param {string[]} args */
function psql(port, args) {
  const connection = ['-X', '-q', '-h', '127.0.0.1', '-p', String(port), '-U', 'postgres', '-d', 'postgres'];
  return run({ command: binary('psql'), args: [...connection, '-v', 'ON_ERROR_STOP=1', ...args] });
}

/** Roles and the database; again on every start, so that a changed file reaches old data. @param {number} port */
export async function applyRoles(port) {
  await psql(port, ['-f', path.join(root, 'docker/postgres/roles.sql')]);
}
