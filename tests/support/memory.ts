import fs from 'node:fs';
import path from 'node:path';

export interface Peak { first: number; peak: number }
export type Peaks = Record<'browser' | 'renderer' | 'web' | 'worker', Peak>;

const page = 4096;
const everyMilliseconds = 500;

function read(file: string): string | null {
  try {
    return fs.readFileSync(file, 'utf8');
  } catch {
    // The process ended meanwhile.
    return null;
  }
}

interface Process { pid: number; parent: number; command: string; bytes: number }

/** Every process there is, with the memory that is its own: pages of the file cache that several map would count twice. */
function listProcesses(): Process[] {
  return fs.readdirSync('/proc').filter((name) => /^\d+$/.test(name)).flatMap((name) => {
    const stat = read(`/proc/${name}/stat`);
    const [, resident = 0, shared = 0] = read(`/proc/${name}/statm`)?.split(' ').map(Number) ?? [];
    const parent = Number(stat?.slice(stat.lastIndexOf(')') + 2).split(' ')[1] ?? 0);
    return [{ pid: Number(name), parent, command: read(`/proc/${name}/cmdline`) ?? '', bytes: (resident - shared) * page }];
  });
}

function treeOf(root: number, all: readonly Process[]): Process[] {
  const own = all.filter(({ pid }) => pid === root);
  return [...own, ...all.filter(({ parent }) => parent === root).flatMap(({ pid }) => treeOf(pid, all))];
}

const sum = (processes: readonly Process[]) => processes.reduce((total, { bytes }) => total + bytes, 0);

/** Watches the browser under a process, and the web server and worker of the test run, until stopped. */
export function watchMemory({ browserOf, pidFolder }: { browserOf: number; pidFolder: string }): { stop: () => Peaks } {
  const pidOf = (name: string) => Number(fs.readFileSync(path.join(pidFolder, `${name}.pid`), 'utf8').split(' ')[0]);
  const [web, worker] = [pidOf('web'), pidOf('worker')];
  const look = (): Record<keyof Peaks, number> => {
    const all = listProcesses();
    const browser = treeOf(browserOf, all).filter(({ command }) => command.includes('chrom'));
    return {
      browser: sum(browser), renderer: Math.max(0, ...browser.filter(({ command }) => command.includes('--type=renderer')).map(({ bytes }) => bytes)),
      web: sum(treeOf(web, all)), worker: sum(treeOf(worker, all)),
    };
  };
  const first = look();
  const peaks = Object.fromEntries(Object.entries(first).map(([name, bytes]) => [name, { first: bytes, peak: bytes }])) as Peaks;
  const take = () => {
    for (const [name, bytes] of Object.entries(look())) peaks[name as keyof Peaks].peak = Math.max(peaks[name as keyof Peaks].peak, bytes);
  };
  const timer = setInterval(take, everyMilliseconds);
  return {
    stop: () => {
      clearInterval(timer);
      take();
      return peaks;
    },
  };
}
