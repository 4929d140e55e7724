'use client';

import { useQueryClient } from '@tanstack/react-query';
import { getCaseContract, listCasesContract, updateCaseContract, type Case } from '@/lib/domain/cases/schema';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { listProblemsContract, type Problem } from '@/lib/domain/problems/schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useApi } from '../api/use-api';
import { useSubmit } from '../api/use-submit';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { caseField } from './case-field';
import { CaseForm } from './case-form';
import { valuesOfCase } from './case-values';
import { useCaseForm } from './use-case-form';

/** Changing a case makes a new revision; studies keep the one they ran with. */
export function CaseEdit({ found, onClose }: { found: Case; onClose: () => void }) {
  const { slug } = useOrganisation();
  const problems = useApi(listProblemsContract, { organisation: slug, query: { limit: 200 } });
  return (
    <>
      <Section note={<p>Saving makes <b>revision {found.revision + 1}</b>. Studies that have data stay with the revision they ran with.</p>}>
        <PageTitle>{found.name}</PageTitle>
      </Section>
      <Answered query={problems} inSection>{({ items }) => <CaseEditForm found={found} problems={items} onClose={onClose} />}</Answered>
    </>
  );
}

function CaseEditForm({ found, problems, onClose }: { found: Case; problems: readonly Problem[]; onClose: () => void }) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const form = useCaseForm(valuesOfCase(found), problems);
  const refresh = () => Promise.all([getCaseContract, listCasesContract, getMatrixContract].map((contract) => queries.invalidateQueries({ queryKey: apiKey(contract) })));
  const submit = useSubmit({
    form, fieldOf: (path) => caseField(path, form.getValues()),
    send: ({ name, problem, options, fields, quantities, sampling, sourceSampling, minimumGrids, boundaryBand, gridPlan, requirements }) =>
      callApi(updateCaseContract, {
        organisation: slug, params: { case: found.slug }, revision: found.revision,
        body: { name, problem, options, fields, quantities, sampling, sourceSampling, minimumGrids, boundaryBand, gridPlan, requirements },
      }),
    onDone: () => { void refresh().then(onClose); },
  });
  const isStale = submit.problem?.status === 412;
  return (
    <CaseForm
      form={form} submit={submit} codes={[]} problems={problems} isNew={false} action="Save as a new revision"
      others={<Button onClick={onClose}>Leave it as it was</Button>}
      wayOn={isStale ? <Button onClick={() => void refresh()}>Show the revision that is there now</Button> : undefined}
    />
  );
}
