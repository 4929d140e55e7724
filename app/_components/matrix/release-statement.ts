import { joinWords } from '@/lib/domain/assessment/series-name';
import type { Matrix, Standing } from '@/lib/domain/matrix/schema';
import { countWord } from '@/lib/domain/numbers/count-word';

type Release = Matrix['releases'][number];

const verb = (number: number, one: string, many: string) => `${countWord(number)} ${number === 1 ? one : many}`;

/** Standings as a person says them of a release. */
export const standingWords: Record<Standing, string> = {
  stands: 'stands', 'does-not-stand': 'does not stand', incomplete: 'is incomplete', withdrawn: 'is withdrawn',
};

/** What the standing of a release rests on: "one case fails and one was not run". */
export function standingReason({ standing, counts }: Release, cases: number): string {
  if (cases === 0) return 'it has no case yet';
  if (standing === 'stands') return counts.passOrExact === 1 ? 'its one case passes' : `all ${countWord(counts.passOrExact)} cases pass`;
  const parts = [
    counts.fail > 0 && verb(counts.fail, 'fails', 'fail'),
    counts.inconclusive > 0 && verb(counts.inconclusive, 'is inconclusive', 'are inconclusive'),
    counts.missesTarget > 0 && verb(counts.missesTarget, 'misses its target', 'miss their targets'),
    counts.notRun > 0 && verb(counts.notRun, 'was not run', 'were not run'),
    counts.inProgress > 0 && verb(counts.inProgress, 'is in progress', 'are in progress'),
  ].filter((part) => part !== false);
  // The first part says what is counted: "one case fails and two were not run".
  return joinWords(parts).replace(/^(\S+) /, (_all, first: string) => `${first} ${first === 'one' ? 'case' : 'cases'} `);
}
