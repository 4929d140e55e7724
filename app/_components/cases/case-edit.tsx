'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { getCaseContract, listCasesContract, updateCaseContract, type Case } from '@/lib/domain/cases/schema';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { listProblemsContract, type Problem } from '@/lib/domain/problems/schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { ConflictNotice } from '../conflict/conflict-notice';
import { useConflict } from '../conflict/use-conflict';
import { useApi } from '../api/use-api';
import { useSubmit } from '../api/use-submit';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { caseField } from './case-field';
import { CaseForm } from './case-form';
import { caseRows } from './case-rows';
import { valuesOfCase } from './case-values';
import { useCaseForm } from './use-case-form';

/** Changing a case makes a new revision; studies keep the one they ran with. */
export function CaseEdit({ opened, onClose }: { opened: Case; onClose: () => void }) {
  const { slug } = useOrganisation();
  const [found, setFound] = useState(opened);
  const problems = useApi(listProblemsContract, { organisation: slug, query: { limit: 200 } });
  return (
    <>
      <Section note={<p>Saving makes <b>revision {found.revision + 1}</b>. Studies that have data stay with the revision they ran with.</p>}>
        <PageTitle>{found.name}</PageTitle>
      </Section>
      <Answered query={problems} inSection>{({ items }) => <CaseEditForm found={found} onMoved={setFound} problems={items} onClose={onClose} />}</Answered>
    </>
  );
}

interface CaseEditFormProps {
  /** The revision that is changed. */
  found: Case;
  /** It is another one now. */
  onMoved: (present: Case) => void;
  problems: readonly Problem[]; onClose: () => void;
}

function CaseEditForm({ found, onMoved, problems, onClose }: CaseEditFormProps) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const form = useCaseForm(valuesOfCase(found), problems);
  const refresh = () => Promise.all([getCaseContract, listCasesContract, getMatrixContract].map((contract) => queries.invalidateQueries({ queryKey: apiKey(contract) })));
  const submit = useSubmit({
    form, fieldOf: (path) => caseField(path, form.getValues()),
    send: ({ name, problem, options, fields, quantities, sampling, sourceSampling, elements, minimumGrids, boundaryBand, gridPlan, requirements }) =>
      callApi(updateCaseContract, {
        organisation: slug, params: { case: found.slug }, revision: found.revision,
        body: { name, problem, options, fields, quantities, sampling, sourceSampling, elements: elements ?? null, minimumGrids, boundaryBand, gridPlan, requirements },
      }),
    onDone: () => { void refresh().then(onClose); },
  });
  const conflict = useConflict({
    submit, base: found, onMoved,
    readPresent: () => callApi(getCaseContract, { organisation: slug, params: { case: found.slug } }),
    takeTheirs: (present) => form.reset(valuesOfCase(present)),
    rowsOf: (side) => caseRows(side === 'mine' ? form.getValues() : valuesOfCase(side)),
  });
  return (
    <CaseForm
      form={form} submit={submit} codes={[]} problems={problems} isNew={false} action="Save as a new revision"
      others={<Button onClick={onClose}>Leave it as it was</Button>}
      conflict={conflict && <ConflictNotice what="case" conflict={conflict} />}
    />
  );
}
