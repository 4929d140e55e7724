import fs from 'node:fs';
import { beginningOf, parentOf, stopRunning } from './processes.mjs';

/** npm and the shell it puts between itself and the script. @returns {() => boolean} whether they still run */
function watchNpm() {
  const shell = process.ppid;
  const npm = parentOf(shell);
  const isNpm = npm !== null && fs.readFileSync(`/proc/${npm}/cmdline`, 'utf8').includes('npm');
  const beginning = isNpm ? beginningOf(npm) : null;
  return () => process.ppid === shell && (!isNpm || beginningOf(npm) === beginning);
}

/**
 * Ends the run cleanly on Ctrl-C, on kill, and when the npm that started it is gone: npm killed by force cannot hand
 * the signal on.
 * @param {(reason: string) => Promise<void>} stop @param {number | null} exitCode null means the signal's own
 */
export function onInterruption(stop, exitCode) {
  let isStopping = false;
  const end = async (/** @type {string} */ reason, /** @type {number} */ code) => {
    if (isStopping) return;
    isStopping = true;
    try {
      await stop(reason);
      await stopRunning();
    } finally {
      process.exit(exitCode ?? code);
    }
  };
  process.on('SIGINT', () => void end('Ctrl-C', 130));
  process.on('SIGTERM', () => void end('a request to end', 143));
  process.on('SIGHUP', () => void end('the closed terminal', 129));
  if (!process.env.npm_lifecycle_event) return;
  const isNpmThere = watchNpm();
  setInterval(() => {
    if (!isNpmThere()) void end('the end of npm', 143);
  }, 500).unref();
}
