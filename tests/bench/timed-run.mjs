import { spawn } from 'node:child_process';
import fs from 'node:fs';

const lookEveryMilliseconds = 10;

/** @param {number} pid @returns {number} most memory so far in MB, 0 where the process is gone */
function peakOf(pid) {
  try {
    return Number(/VmHWM:\s+(\d+)/.exec(fs.readFileSync(`/proc/${pid}/status`, 'utf8'))?.[1] ?? 0) / 1024;
  } catch {
    return 0;
  }
}

/**
 * Runs a program to its end. Throws with what it said where it fails.
 * @param {string[]} command
 * @returns {Promise<{ seconds: number, megabytes: number, output: string }>}
 */
export async function timedRun([program, ...args]) {
  const start = performance.now();
  const child = spawn(program, args, { stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  let complaint = '';
  let megabytes = 0;
  child.stdout.on('data', (text) => (output += text));
  child.stderr.on('data', (text) => (complaint += text));
  const watch = setInterval(() => (megabytes = Math.max(megabytes, peakOf(child.pid ?? 0))), lookEveryMilliseconds);
  const code = await new Promise((resolve, reject) => child.once('error', reject).once('close', resolve));
  clearInterval(watch);
  if (code !== 0) throw new Error(`${[program, ...args].join(' ')} ended with ${code}:\n${complaint}`);
  return { seconds: (performance.now() - start) / 1000, megabytes, output };
}

/** @param {number[]} values */
export function median(values) {
  const sorted = [...values].sort((a, b) => a - b);
  return (sorted[Math.floor((sorted.length - 1) / 2)] + sorted[Math.ceil((sorted.length - 1) / 2)]) / 2;
}
