import fs from 'node:fs';
import path from 'node:path';
import { need } from '../environment';

/** A process of this test run; whoever started it starts it again when it dies. */
function pidOf(name: string): number {
  return Number(fs.readFileSync(path.join(need('TEST_PID_FOLDER'), `${name}.pid`), 'utf8').split(' ')[0]);
}

/** To the process as it is now; one that is just being started again is left alone. */
export function signal(name: string, kind: 'SIGKILL' | 'SIGSTOP' | 'SIGCONT'): void {
  try {
    process.kill(pidOf(name), kind);
  } catch (error) {
    if ((error as { code?: unknown }).code !== 'ESRCH') throw error;
  }
}
