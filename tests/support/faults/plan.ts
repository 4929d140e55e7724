import type { Fault } from '../network/faults.mjs';
import { randomOf, type Random } from './random';

const killable = ['web', 'worker', 'redis', 'storage', 'storage-object', 'postgres'] as const;
type Killable = (typeof killable)[number];

export type PlannedFault = { at: number } & (
  | { kind: 'kill'; process: Killable } | { kind: 'empty-queue' } | { kind: 'network'; fault: Fault } | { kind: 'stop-worker'; milliseconds: number }
);

/** One study: how its files are sent, whether it converges, and whether a bad file comes first. */
export interface Lane { sending: 'put' | 'parts'; converges: boolean; badFileFirst: boolean; begins: number }

export interface Schedule { seed: number; lanes: Lane[]; secondWorker: boolean; faults: PlannedFault[] }

const span = 2200;

function networkFault(random: Random): Fault {
  const client = random.pick(['web', 'worker', null] as const);
  const milliseconds = random.between(300, 2500);
  const roll = random.next();
  if (roll < 0.3) return { client: 'worker', service: null, kind: 'lost', milliseconds: random.between(1000, 4000) };
  if (roll < 0.45) return { client, service: random.pick(['postgres', 'redis', 'storage'] as const), kind: 'cut', milliseconds };
  if (roll < 0.6) return { client, service: 'storage', kind: 'error', status: random.pick([500, 503, 507] as const), milliseconds };
  if (roll < 0.75) return { client: 'worker', service: 'storage', kind: 'truncate', milliseconds };
  if (roll < 0.8) return { client, service: 'storage', kind: 'stall', milliseconds: random.between(100, 600) };
  return { client, service: null, kind: 'latency', delay: random.between(5, 60), milliseconds };
}

function plannedFault(random: Random): PlannedFault {
  const at = random.between(0, span);
  const roll = random.next();
  if (roll < 0.45) return { at, kind: 'kill', process: random.pick(killable) };
  if (roll < 0.58) return { at, kind: 'empty-queue' };
  if (roll < 0.66) return { at, kind: 'stop-worker', milliseconds: random.between(5500, 7000) };
  return { at, kind: 'network', fault: networkFault(random) };
}

/** What happens under a seed: so many studies at once, and one to three faults at moments of their own. */
export function planOf(seed: number, lanes: number): Schedule {
  const random = randomOf(seed);
  return {
    seed,
    secondWorker: random.next() < 0.3,
    faults: Array.from({ length: random.between(1, 3) }, () => plannedFault(random)).sort((left, right) => left.at - right.at),
    lanes: Array.from({ length: lanes }, () => ({
      sending: random.pick(['put', 'parts'] as const), converges: random.next() < 0.7, badFileFirst: random.next() < 0.15, begins: random.between(0, 600),
    })),
  };
}

function faultInWords(planned: PlannedFault): string {
  const at = `after ${planned.at} ms`;
  if (planned.kind === 'kill') return `${at} ${planned.process} is killed by force`;
  if (planned.kind === 'empty-queue') return `${at} Redis is emptied`;
  if (planned.kind === 'stop-worker') return `${at} the worker is stopped for ${planned.milliseconds} ms and goes on`;
  const { client, service, kind, status, delay, milliseconds } = planned.fault;
  return `${at} for ${milliseconds} ms the way from ${client ?? 'web and worker'} to ${service ?? 'every service'} is: ${[kind, status, delay].filter(Boolean).join(' ')}`;
}

/** The plan as somebody who looks for the fault wants to read it. */
export function inWords({ seed, lanes, secondWorker, faults }: Schedule): string {
  return [
    `Seed ${seed}: ${lanes.length} studies at once${secondWorker ? ', two workers' : ''}.`,
    ...lanes.map((lane, index) => `  Study ${index + 1} begins after ${lane.begins} ms, sends by ${lane.sending}, ${lane.converges ? 'converges' : 'does not converge'}${lane.badFileFirst ? ', sends a bad file first' : ''}.`),
    ...faults.map((fault) => `  ${faultInWords(fault)}.`),
  ].join('\n');
}
