'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { apiKey } from '@/app/_components/api/api-key';
import { problemOf } from '@/app/_components/api/problem-of';
import { callApi } from '@/app/_components/api/call-api';
import { ProblemNotice } from '@/app/_components/forms/problem-notice';
import { NeedsEngineer } from '@/app/_components/organisation/needs-engineer';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { Button } from '@/app/_components/ui/button';
import { ButtonLink } from '@/app/_components/ui/button-link';
import { Section } from '@/app/_components/ui/section';
import { assessStudyContract, getStudyContract, reviseStudyContract, type Study } from '@/lib/domain/studies/schema';

/** What may be done with a study that does not collect: a new revision, and another try where the assessment failed. */
export function WayOn({ study }: { study: Study }) {
  const { slug, may } = useOrganisation();
  const router = useRouter();
  const queries = useQueryClient();
  const refresh = () => queries.invalidateQueries({ queryKey: apiKey(getStudyContract) });
  const target = { organisation: slug, params: { id: study.id } };
  const revise = useMutation({
    mutationFn: () => callApi(reviseStudyContract, target),
    onSuccess: async () => { await refresh(); router.push(`/${slug}/studies/${study.id}`); window.scrollTo(0, 0); },
  });
  const assess = useMutation({ mutationFn: () => callApi(assessStudyContract, target), onSettled: refresh });
  const canRevise = study.state === 'assessed' || study.state === 'assessment-failed';
  if (study.revision < study.currentRevision) {
    return (
      <Section heading="Later revision" screenOnly>
        <p className="mb-4">This is revision {study.revision} as it was. The study is now at revision {study.currentRevision}.</p>
        <ButtonLink href={`/${slug}/studies/${study.id}`}>Read revision {study.currentRevision}</ButtonLink>
      </Section>
    );
  }
  if (!canRevise) return null;
  const problem = problemOf(revise.error ?? assess.error, 'Not changed');
  return (
    <Section heading="Go on" screenOnly note={<p>An assessment never changes. A new revision begins with the same grids and files; this one stays readable.</p>}>
      {may('work.write') ? (
        <div className="flex flex-wrap gap-3">
          {study.state === 'assessment-failed' && <Button kind="primary" disabled={assess.isPending} onClick={() => assess.mutate()}>Run the assessment again</Button>}
          <Button disabled={revise.isPending} onClick={() => revise.mutate()}>Add a grid in a new revision</Button>
        </div>
      ) : <NeedsEngineer what="open a new revision" />}
      <ProblemNotice problem={problem} />
    </Section>
  );
}
