'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { getProblemContract, listProblemsContract, updateProblemContract, type Problem } from '@/lib/domain/problems/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { ConflictNotice } from '../conflict/conflict-notice';
import { useConflict } from '../conflict/use-conflict';
import { useSubmit } from '../api/use-submit';
import { checkedResolver } from '../forms/checked-resolver';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { ProblemForm } from './problem-form';
import { problemRows } from './problem-rows';
import { checkProblemValues, problemField, valuesOfProblem } from './problem-values';

/** Changing a problem makes a new revision; studies keep the one they ran with. */
export function ProblemEdit({ opened, onClose }: { opened: Problem; onClose: () => void }) {
  const [problem, setProblem] = useState(opened);
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const form = useForm({ resolver: checkedResolver(checkProblemValues, problemField), mode: 'onTouched', defaultValues: valuesOfProblem(problem) });
  const refresh = () => Promise.all([
    queries.invalidateQueries({ queryKey: apiKey(getProblemContract) }), queries.invalidateQueries({ queryKey: apiKey(listProblemsContract) }),
  ]);
  const submit = useSubmit({
    form, fieldOf: (path) => problemField(path, form.getValues()),
    send: ({ slug: ownSlug, ...changes }) => callApi(updateProblemContract, { organisation: slug, params: { problem: ownSlug ?? problem.slug }, revision: problem.revision, body: changes }),
    onDone: () => { void refresh().then(onClose); },
  });
  const conflict = useConflict({
    submit, base: problem, onMoved: setProblem,
    readPresent: () => callApi(getProblemContract, { organisation: slug, params: { problem: problem.slug } }),
    takeTheirs: (present) => form.reset(valuesOfProblem(present)),
    rowsOf: (side) => problemRows(side === 'mine' ? form.getValues() : valuesOfProblem(side)),
  });
  return (
    <>
      <Section note={<p>Saving makes <b>revision {problem.revision + 1}</b>. Studies stay with the revision they ran with.</p>}>
        <PageTitle>{problem.name}</PageTitle>
      </Section>
      <ProblemForm
        form={form} submit={submit} isNew={false} action="Save as a new revision"
        others={<Button onClick={onClose}>Leave it as it was</Button>}
        conflict={conflict && <ConflictNotice what="problem" conflict={conflict} />}
      />
    </>
  );
}
