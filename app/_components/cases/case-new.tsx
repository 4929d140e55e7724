'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { createCaseContract, listCasesContract } from '@/lib/domain/cases/schema';
import { listCodesContract, type Code } from '@/lib/domain/codes/schema';
import { listProblemsContract, type Problem } from '@/lib/domain/problems/schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useApi } from '../api/use-api';
import { useSubmit } from '../api/use-submit';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { ButtonLink } from '../ui/button-link';
import { EmptyState } from '../ui/empty-state';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { caseField } from './case-field';
import { CaseForm } from './case-form';
import { emptyCase, newField } from './case-values';
import { useCaseForm } from './use-case-form';

interface Chosen { code: string; problem: string }

export function CaseNew({ chosen }: { chosen: Chosen }) {
  const { slug, may } = useOrganisation();
  const codes = useApi(listCodesContract, { organisation: slug, query: { limit: 200 } });
  const problems = useApi(listProblemsContract, { organisation: slug, query: { limit: 200 } });
  return (
    <OrganisationPage place={[{ label: 'Cases', href: `/${slug}/cases` }, { label: 'new' }]}>
      <Section>
        <PageTitle under="A code on a problem with named options, and what is promised about it.">New case</PageTitle>
        {!may('work.write') && <div className="mt-6"><NeedsEngineer what="make a case" /></div>}
      </Section>
      {may('work.write') && (
        <Answered query={codes} inSection>
          {({ items }) => <Answered query={problems} inSection>{(found) => <CaseStart chosen={chosen} codes={items} problems={found.items} />}</Answered>}
        </Answered>
      )}
    </OrganisationPage>
  );
}

function CaseStart({ chosen, codes, problems }: { chosen: Chosen; codes: readonly Code[]; problems: readonly Problem[] }) {
  const { slug } = useOrganisation();
  if (codes.length > 0 && problems.length > 0) return <NewCaseForm chosen={chosen} codes={codes} problems={problems} />;
  const actions = (
    <>
      {codes.length === 0 && <ButtonLink href={`/${slug}/codes`}>Make a code</ButtonLink>}
      {problems.length === 0 && <ButtonLink href={`/${slug}/problems/new`}>Make a problem</ButtonLink>}
    </>
  );
  return <Section><EmptyState actions={actions}>A case needs a code and a problem.</EmptyState></Section>;
}

function NewCaseForm({ chosen, codes, problems }: { chosen: Chosen; codes: readonly Code[]; problems: readonly Problem[] }) {
  const { slug } = useOrganisation();
  const router = useRouter();
  const queries = useQueryClient();
  const problem = problems.find((each) => each.slug === chosen.problem) ?? (problems.length === 1 ? problems[0] : undefined);
  const start = emptyCase({ code: chosen.code || (codes.length === 1 ? (codes[0]?.slug ?? '') : ''), problem: problem?.slug ?? '' });
  const form = useCaseForm({ ...start, fields: Object.keys(problem?.exact ?? {}).map(newField) }, problems);
  const submit = useSubmit({
    form, fieldOf: (path) => caseField(path, form.getValues()),
    send: (typed) => callApi(createCaseContract, { organisation: slug, body: typed }),
    onDone: (made) => {
      void queries.invalidateQueries({ queryKey: apiKey(listCasesContract) });
      router.push(`/${slug}/cases/${made.slug}`);
    },
  });
  return <CaseForm form={form} submit={submit} codes={codes} problems={problems} isNew action="Make the case" />;
}
