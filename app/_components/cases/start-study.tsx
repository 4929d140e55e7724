'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { plannedRefinement } from '@/lib/domain/cases/planned-refinement';
import type { Case } from '@/lib/domain/cases/schema';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { createStudyContract, listStudiesContract } from '@/lib/domain/studies/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { problemOf } from '../api/problem-of';
import { useOrganisation } from '../organisation/organisation-context';
import { TextButton } from '../ui/text-link';

interface StartStudyProps { found: Case; release: string }

/** Makes the study of a case on a release with the grids its plan names, and goes there. */
export function StartStudy({ found, release }: StartStudyProps) {
  const { slug } = useOrganisation();
  const router = useRouter();
  const queries = useQueryClient();
  const start = useMutation({
    mutationFn: () => callApi(createStudyContract, {
      organisation: slug, body: { case: found.slug, release, refinement: plannedRefinement(found.gridPlan), grids: found.gridPlan },
    }),
    onSuccess: (study) => {
      void queries.invalidateQueries({ queryKey: apiKey(listStudiesContract) });
      void queries.invalidateQueries({ queryKey: apiKey(getMatrixContract) });
      router.push(`/${slug}/studies/${study.id}`);
    },
  });
  const fault = problemOf(start.error, 'Not started')?.detail;
  return (
    <>
      <TextButton className="min-h-11 tablet:min-h-0" disabled={start.isPending} onClick={() => start.mutate()}>{start.isPending ? 'Starting the study' : 'Start the study'}</TextButton>
      {fault && <span role="alert" className="block text-note text-fail-text"><b>Not started.</b> {fault}</span>}
    </>
  );
}
