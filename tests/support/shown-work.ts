import { createReleaseContract } from '@/lib/domain/codes/schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok } from './api';
import { signUp, type Person } from './people';
import { awaitOutcome } from './study';
import { makeWork, type Work } from './work';

const errorsAt = (order: number) => [8, 16, 32, 64].map((n) => {
  const error = 0.5 * n ** -order;
  return { label: `n${n}`, cellsPerDirection: n, errors: { T: { L2: error, Linf: 2 * error } } };
});

export interface ShownWork extends Work { person: Person; study: string; spaceTimeStudy: string }

/** An organisation with something on every page: a case that passes on one release and fails on the next. */
export async function makeShownWork(): Promise<ShownWork> {
  const person = await signUp();
  const work = await makeWork(person);
  await ok(person, createReleaseContract, { params: { code: work.code.slug }, body: { version: '1.1.0' } });
  const run = async (release: string, order: number) => {
    const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release, grids: errorsAt(order) } });
    await awaitOutcome(person, study.id);
    return study.id;
  };
  const matrix = [8, 16, 32].flatMap((n) => [0.1, 0.05, 0.025].map((dt) => ({ label: `n${n}-dt${dt}`, cellsPerDirection: n, dt, errors: { T: { L2: 3 / n ** 2 + 0.2 * dt } } })));
  const spaceTime = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', refinement: 'space-time', grids: matrix } });
  await awaitOutcome(person, spaceTime.id);
  await run('1.0.0', 2);
  return { ...work, person, study: await run('1.1.0', 1.2), spaceTimeStudy: spaceTime.id };
}
