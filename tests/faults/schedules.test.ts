import { beforeAll, describe, expect, it } from 'vitest';
import type { Site } from '@/tests/support/faults/careful-study';
import { inWords, planOf } from '@/tests/support/faults/plan';
import { runSchedule } from '@/tests/support/faults/run-schedule';
import { signUp } from '@/tests/support/people';
import { makeWork } from '@/tests/support/work';

/** Studies that are under way at once under the same faults; each counts as a schedule. */
const lanes = 4;
const given = process.env.FAULT_SEED === undefined ? null : Number(process.env.FAULT_SEED);
const rounds = given === null ? Math.ceil(Number(process.env.FAULT_SCHEDULES ?? 16) / lanes) : 1;
const firstSeed = given ?? Number(process.env.FAULT_BASE ?? 1);
/** An organisation is left alone once it has had so many studies, so that checking it stays quick. */
const roundsOfASite = 25;

let sites: Site[] = [];

const makeSites = () => Promise.all(Array.from({ length: lanes }, async () => {
  const engineer = await signUp('Faults');
  return { engineer, work: await makeWork(engineer) };
}));

beforeAll(async () => {
  sites = await makeSites();
});

describe('whatever dies while studies are sent, read and assessed', () => {
  it.each(Array.from({ length: rounds }, (_, index) => firstSeed + index))('holds all that was confirmed, once (seed %i)', async (seed) => {
    if (seed !== firstSeed && (seed - firstSeed) % roundsOfASite === 0) sites = await makeSites();
    const schedule = planOf(seed, lanes);
    const faults = await runSchedule(schedule, sites);
    expect(faults, `${inWords(schedule)}\nAgain: npm run test:faults -- --seed ${seed}`).toEqual([]);
  }, 240_000);
});
