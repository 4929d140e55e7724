import { stopRunning } from './processes.mjs';

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
  if (process.env.npm_lifecycle_event) {
    const parent = process.ppid;
    setInterval(() => {
      if (process.ppid !== parent) void end('the end of npm', 143);
    }, 500).unref();
  }
}
