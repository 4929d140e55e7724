import type { Matrix } from '@/lib/domain/matrix/schema';
import { standingWords } from './release-statement';

type Release = Matrix['releases'][number];

const counted: { name: string; of: (counts: Release['counts']) => number }[] = [
  { name: 'Pass or exact', of: ({ passOrExact }) => passOrExact },
  { name: 'Meets target', of: ({ meetsTarget }) => meetsTarget },
  { name: 'Fail', of: ({ fail }) => fail },
  { name: 'Inconclusive', of: ({ inconclusive }) => inconclusive },
  { name: 'Misses target', of: ({ missesTarget }) => missesTarget },
  { name: 'Not run', of: ({ notRun }) => notRun },
  { name: 'In progress', of: ({ inProgress }) => inProgress },
];

interface MatrixFeetProps { releases: readonly Release[]; caseColumn: string }

/** Each outcome counted apart, and the standing of each release in words. */
export function MatrixFeet({ releases, caseColumn }: MatrixFeetProps) {
  return (
    <tfoot className="border-t-[1.5px] border-ink">
      {counted.filter(({ of }) => releases.some(({ counts }) => of(counts) > 0)).map(({ name, of }) => (
        <tr key={name}>
          <th scope="row" className={`${caseColumn} py-0.5 text-note text-graphite`}>{name}</th>
          <td className="max-tablet:hidden" />
          {releases.map((release) => <td key={release.id} className="py-0.5 text-center text-note text-graphite">{of(release.counts) || ''}</td>)}
          <td className="max-tablet:hidden" />
        </tr>
      ))}
      <tr>
        <th scope="row" className={`${caseColumn} pt-1 pb-2 text-note`}>Standing</th>
        <td className="max-tablet:hidden" />
        {releases.map(({ id, standing }) => (
          <td key={id} className={`px-1 pt-1 pb-2 text-center text-note leading-4 ${standing === 'does-not-stand' ? 'font-semibold text-fail-text' : standing === 'stands' ? '' : 'text-graphite'}`}>
            {standingWords[standing].replace(/^is /, '')}
          </td>
        ))}
        <td className="max-tablet:hidden" />
      </tr>
    </tfoot>
  );
}
