'use client';

import { useMutation } from '@tanstack/react-query';
import { callApi } from '@/app/_components/api/call-api';
import { problemOf } from '@/app/_components/api/problem-of';
import { useApi } from '@/app/_components/api/use-api';
import { ProblemNotice } from '@/app/_components/forms/problem-notice';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { Button } from '@/app/_components/ui/button';
import { DateTime } from '@/app/_components/ui/date-time';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { Section } from '@/app/_components/ui/section';
import { formatError } from '@/lib/domain/numbers/format-error';
import { listRechecksContract, requestRecheckContract, type Recheck } from '@/lib/domain/studies/recheck-schema';
import type { Study } from '@/lib/domain/studies/schema';

const pollMilliseconds = 1500;

function words({ result, largestDifference, differences }: Recheck): string {
  const [first] = differences;
  switch (result) {
    case null: return 'under way';
    case 'identical': return 'identical to the last digit';
    case 'within-1e-10': return `the same within 1 × 10⁻¹⁰; the largest difference is ${formatError(largestDifference ?? 0, 2).text} of the value`;
    case 'not-reproduced': return `not reproduced${first ? `: ${first.path} was ${String(first.before ?? 'not there')} and is ${String(first.after ?? 'not there')}${differences.length > 1 ? `, and ${differences.length - 1} more` : ''}` : ''}`;
  }
}

/** Whether the stored files still give the result that was kept. */
export function RecheckSection({ study }: { study: Study }) {
  const { slug } = useOrganisation();
  const target = { organisation: slug, params: { id: study.id } };
  const rechecks = useApi(listRechecksContract, target, { refetchEvery: ({ items }) => (items.some(({ state }) => state === 'running') ? pollMilliseconds : false) });
  const request = useMutation({ mutationFn: () => callApi(requestRecheckContract, target), onSettled: () => rechecks.refetch() });
  const items = rechecks.data?.items ?? [];
  const isRunning = request.isPending || items[0]?.state === 'running';
  return (
    <Section heading="Re-check" note={<p>Reads every stored file again, computes the result anew and compares it by value. Nothing of the study changes.</p>}>
      {items.length > 0 && (
        <ul className="mb-4 flex max-w-[46em] flex-col gap-1" aria-live="polite">
          {items.slice(0, 3).map((item) => <li key={item.id}><DateTime value={item.createdAt} show="both" /> <span className="text-graphite">(revision {item.revision})</span>: <FormulaText text={words(item)} />.</li>)}
        </ul>
      )}
      <Button disabled={isRunning} onClick={() => request.mutate()}>{isRunning ? 'Reading the files' : 'Check the result again'}</Button>
      <ProblemNotice problem={problemOf(request.error, 'Not checked')} />
    </Section>
  );
}
