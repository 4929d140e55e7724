import fs from 'node:fs';
import path from 'node:path';
import { bundleWorker } from './bundle-worker.mjs';
import { withLock } from './lock.mjs';
import { npmBinary, root, stateFolder } from './places.mjs';
import { beginningOf, run } from './processes.mjs';
import { hashSources, startFiles } from './sources.mjs';

const buildsFolder = path.join(stateFolder, 'builds');
const KEPT = 3;

/** @param {string} folder of a build */
function isInUse(folder) {
  const users = path.join(folder, 'users');
  if (!fs.existsSync(users)) return false;
  return fs.readdirSync(users).some((name) => {
    const [pid, beginning] = name.split('-');
    return beginningOf(Number(pid)) === beginning;
  });
}

/** @param {string} folder of a build; while this process lives, the build is not thrown away */
function claim(folder) {
  fs.writeFileSync(path.join(folder, 'users', `${process.pid}-${beginningOf(process.pid)}`), '');
  const now = new Date();
  fs.utimesSync(folder, now, now);
}

/** @param {string} current */
function dropOldBuilds(current) {
  const folders = fs
    .readdirSync(buildsFolder)
    .map((name) => path.join(buildsFolder, name))
    .sort((a, b) => fs.statSync(b).mtimeMs - fs.statSync(a).mtimeMs);
  for (const folder of folders.slice(KEPT)) {
    if (folder !== current && !isInUse(folder)) fs.rmSync(folder, { recursive: true, force: true });
  }
}

/** @param {string} folder of the web server in web/ and the worker in worker/ */
export async function buildInto(folder) {
  const env = { ...process.env, NEXT_TELEMETRY_DISABLED: '1', NODE_ENV: 'production' };
  await run({
    command: npmBinary('next'),
    args: ['build'],
    cwd: root,
    env,
    onOutput: (output) => process.stdout.write(output),
  });
  const web = path.join(folder, 'web');
  fs.mkdirSync(folder, { recursive: true });
  // cp -a, since the standalone folder holds symbolic links.
  await run({ command: 'cp', args: ['-a', path.join(root, '.next/standalone'), web] });
  await run({ command: 'cp', args: ['-a', path.join(root, '.next/static'), path.join(web, '.next/static')] });
  if (fs.existsSync(path.join(root, 'public'))) {
    await run({ command: 'cp', args: ['-a', path.join(root, 'public'), path.join(web, 'public')] });
  }
  for (const name of startFiles) fs.copyFileSync(path.join(root, 'docker', name), path.join(web, name));
  await bundleWorker(path.join(folder, 'worker'));
  fs.mkdirSync(path.join(folder, 'users'));
}

/**
 * Builds web and worker, or takes the build these sources already have. It is served from a folder of its own, so a
 * later build disturbs nothing that runs.
 * @returns {Promise<string>} the folder of the build, with web/ and worker/
 */
export function ensureBuild() {
  return withLock('build', 'another build', async () => {
    const hash = hashSources();
    const folder = path.join(buildsFolder, hash);
    if (fs.existsSync(folder)) {
      claim(folder);
      return folder;
    }
    console.log('Building …');
    const unfinished = path.join(stateFolder, 'unfinished-build');
    fs.rmSync(unfinished, { recursive: true, force: true });
    await buildInto(unfinished);
    // Sources edited meanwhile: the build is used once, but it is not what either hash names.
    const name = hashSources() === hash ? hash : `${hash}-edited-${Date.now()}`;
    fs.mkdirSync(buildsFolder, { recursive: true });
    const finished = path.join(buildsFolder, name);
    fs.renameSync(unfinished, finished);
    claim(finished);
    dropOldBuilds(finished);
    return finished;
  });
}
