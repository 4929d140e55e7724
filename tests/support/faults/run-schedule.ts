import { setTimeout as pause } from 'node:timers/promises';
import { Redis } from 'ioredis';
import { openDatabase } from '@/db/client';
import { readEnv } from '@/lib/env';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { checkRecords } from '@/lib/services/records/check-records';
import { adminDatabase } from '../admin-database';
import { need } from '../environment';
import { startWorker } from '../extra-process';
import { breakNetwork, mendNetwork } from '../network/break-network';
import { carryOut, faultsSeen, type Site } from './careful-study';
import type { PlannedFault, Schedule } from './plan';
import { signal } from './processes';

async function emptyQueue(): Promise<void> {
  const redis = new Redis(need('REDIS_URL'), { maxRetriesPerRequest: 3 });
  redis.on('error', () => undefined);
  // Where Redis is away at that moment there is nothing to empty.
  await redis.flushall().catch(() => undefined);
  redis.disconnect();
}

async function inflict(planned: PlannedFault): Promise<void> {
  await pause(planned.at);
  if (planned.kind === 'kill') signal(planned.process, 'SIGKILL');
  else if (planned.kind === 'empty-queue') await emptyQueue();
  else if (planned.kind === 'network') await breakNetwork(planned.fault);
  else {
    signal('worker', 'SIGSTOP');
    await pause(planned.milliseconds);
    signal('worker', 'SIGCONT');
  }
}

/** What the records say of an organisation: what is wrong, in words. */
export async function recordFaults(organisationId: string): Promise<string[]> {
  const { db } = openDatabase(need('MAINTENANCE_DATABASE_URL'), () => undefined);
  try {
    const faults: string[] = [];
    const storage = createStorage(storageOptionsOf(readEnv(process.env)));
    await checkRecords({ db, storage, organisationId, isHashed: true, clock: () => new Date() }, ({ place, id, fault }) => faults.push(`${place} ${id} ${fault}`));
    return faults;
  } finally {
    await db.destroy();
  }
}

/** What was killed last may still be starting: who looks at everything waits for it, for a while. */
async function onceReachable<T>(work: () => Promise<T>): Promise<T> {
  for (let tries = 1; ; tries += 1) {
    try {
      return await work();
    } catch (error) {
      if (tries === 40) throw error;
      await pause(500);
    }
  }
}

/** Rows of the outbox that are not done, once there has been a moment to end them. */
async function openRows(organisationId: string): Promise<string[]> {
  const read = async () => (await adminDatabase().query<{ job: string; state: string; last_error: string | null }>(
    "select job, state, last_error from outbox where organisation_id = $1 and state <> 'done'", [organisationId])).rows;
  for (let tries = 0; tries < 300 && (await read()).length > 0; tries += 1) await pause(200);
  return (await read()).map(({ job, state, last_error }) => `${job} is still ${state}${last_error ? `: ${last_error}` : ''}`);
}

async function studiesOf(organisationId: string): Promise<number> {
  const { rows } = await adminDatabase().query<{ n: number }>('select count(*)::int as n from studies where organisation_id = $1', [organisationId]);
  return rows[0]?.n ?? 0;
}

/** Carries out a schedule, lets everything come to rest, and tells what is wrong afterwards; nothing where all holds. */
export async function runSchedule(schedule: Schedule, sites: Site[]): Promise<string[]> {
  const before = await Promise.all(sites.map(({ engineer }) => studiesOf(engineer.at.id)));
  const second = schedule.secondWorker ? await startWorker('worker-2', Number(new URL(need('WEB_URL')).port) + 15) : null;
  try {
    const lanes = schedule.lanes.map((lane, index) => ({ lane, site: sites[index] as Site }));
    const faulty = Promise.all(schedule.faults.map(inflict));
    const told = await Promise.all(lanes.map(async ({ lane, site }) => {
      try {
        return { lane, site, done: await carryOut(site, lane), fault: null };
      } catch (error) {
        return { lane, site, done: null, fault: String(error) };
      }
    }));
    await faulty;
    await mendNetwork();
    const seen = await Promise.all(told.map(async ({ lane, site, done, fault }, index) => {
      if (done === null) return [fault];
      const faults = await faultsSeen(site, lane, done);
      const made = (await studiesOf(site.engineer.at.id)) - (before[index] ?? 0);
      if (made !== 1) faults.push(`${made} studies were made; one was asked for`);
      return [...faults, ...await openRows(site.engineer.at.id), ...await onceReachable(() => recordFaults(site.engineer.at.id))];
    }));
    return seen.flat();
  } finally {
    await mendNetwork();
    await second?.end('SIGKILL');
  }
}
