import { FlagLine } from '@/app/_components/ui/page-title';
import { joinWords } from '@/lib/domain/assessment/series-name';
import type { Study } from '@/lib/domain/studies/schema';

/** What came or changed when data was already there: whoever reads the outcome must know. */
export function AfterData({ study }: { study: Study }) {
  const labels = study.grids.filter((grid) => grid.afterData).map((grid) => grid.label).reverse();
  if (labels.length === 0 && !study.definitionAfterData) return null;
  return (
    <FlagLine>
      <b>After data.</b>
      {labels.length > 0 && ` ${labels.length === 1 ? 'Grid' : 'Grids'} ${joinWords(labels)} ${labels.length === 1 ? 'was' : 'were'} added or changed after the first data.`}
      {study.definitionAfterData && ' The case or its problem was changed after the first data, and this revision is judged by the change.'}
    </FlagLine>
  );
}
