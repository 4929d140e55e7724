'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { createProblemContract, listProblemsContract } from '@/lib/domain/problems/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { checkedResolver } from '../forms/checked-resolver';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { ProblemForm } from './problem-form';
import { checkProblemValues, emptyProblem, problemField } from './problem-values';

export function ProblemNew() {
  const { slug, may } = useOrganisation();
  const router = useRouter();
  const queries = useQueryClient();
  const form = useForm({ resolver: checkedResolver(checkProblemValues, problemField), mode: 'onTouched', defaultValues: emptyProblem });
  const submit = useSubmit({
    form, fieldOf: (path) => problemField(path, form.getValues()),
    send: (typed) => callApi(createProblemContract, { organisation: slug, body: typed }),
    onDone: (problem) => {
      void queries.invalidateQueries({ queryKey: apiKey(listProblemsContract) });
      router.push(`/${slug}/problems/${problem.slug}`);
    },
  });
  return (
    <OrganisationPage place={[{ label: 'Problems', href: `/${slug}/problems` }, { label: 'new' }]}>
      <Section>
        <PageTitle under="Equations, constants, domain, and the exact or manufactured solution.">New problem</PageTitle>
        {!may('work.write') && <div className="mt-6"><NeedsEngineer what="make a problem" /></div>}
      </Section>
      {may('work.write') && <ProblemForm form={form} submit={submit} isNew action="Make the problem" />}
    </OrganisationPage>
  );
}
