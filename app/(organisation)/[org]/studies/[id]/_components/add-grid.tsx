'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { apiKey } from '@/app/_components/api/api-key';
import { callApi } from '@/app/_components/api/call-api';
import { problemOf } from '@/app/_components/api/problem-of';
import { NumberField } from '@/app/_components/forms/number-field';
import { ProblemNotice } from '@/app/_components/forms/problem-notice';
import { SelectField } from '@/app/_components/forms/select-field';
import { TextField } from '@/app/_components/forms/text-field';
import { typedNumber } from '@/app/_components/forms/typed-number';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { Button } from '@/app/_components/ui/button';
import { gridInputSchema } from '@/lib/domain/studies/input';
import { addGridContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';

const spacings = { cellsPerDirection: 'Cells along each direction', cells: 'Cells in all', h: 'Spacing h', dt: 'Time step Δt' } as const;
type SpacingName = keyof typeof spacings;

/** The way the other grids state their spacing. */
function usualSpacing({ grids, refinement }: Study): SpacingName {
  if (refinement === 'time') return 'dt';
  return (['cellsPerDirection', 'cells', 'h'] as const).find((name) => grids.some((grid) => grid[name] !== undefined)) ?? 'cellsPerDirection';
}

/** One grid more: a label and how fine it is. */
export function AddGrid({ study, onDone }: { study: Study; onDone: () => void }) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const [label, setLabel] = useState('');
  const [name, setName] = useState<SpacingName>(usualSpacing(study));
  const [spacing, setSpacing] = useState('');
  const [step, setStep] = useState('');
  const [areFaultsShown, setAreFaultsShown] = useState(false);
  const isBoth = study.refinement === 'space-time';
  const value = typedNumber(spacing);
  const dt = isBoth ? typedNumber(step) : undefined;
  const checked = gridInputSchema.safeParse({ label: label.trim(), ...(value === undefined ? {} : { [name]: value }), ...(dt === undefined ? {} : { dt }) });
  const faultAt = (path: string) => (areFaultsShown && !checked.success ? checked.error.issues.find((issue) => issue.path[0] === path)?.message : undefined);
  const add = useMutation({
    mutationFn: (body: typeof gridInputSchema._output) => callApi(addGridContract, { organisation: slug, params: { id: study.id }, body }),
    onSuccess: async () => { await queries.invalidateQueries({ queryKey: apiKey(getStudyContract) }); onDone(); },
  });
  const isTime = study.refinement === 'time';
  return (
    <form
      aria-label="Add a grid" noValidate className="mt-6"
      onSubmit={(event) => { event.preventDefault(); setAreFaultsShown(true); if (checked.success) add.mutate(checked.data); }}
    >
      <div className="grid max-w-[700px] gap-5 tablet:grid-cols-3">
        <TextField label="Label" hint="Such as n256." value={label} error={faultAt('label')} autoComplete="off" spellCheck={false} autoFocus onChange={(event) => setLabel(event.target.value)} />
        <SelectField label="Fineness stated as" value={name} onChange={(event) => setName(event.target.value as SpacingName)}>
          {(Object.keys(spacings) as SpacingName[]).filter((each) => (each === 'dt') === isTime).map((each) => <option key={each} value={each}>{spacings[each]}</option>)}
        </SelectField>
        <NumberField label={spacings[name]} value={spacing} error={faultAt(name)} onChange={(event) => setSpacing(event.target.value)} />
        {isBoth && <NumberField label={spacings.dt} value={step} error={faultAt('dt')} onChange={(event) => setStep(event.target.value)} />}
      </div>
      <ProblemNotice problem={problemOf(add.error, 'Not added')} />
      <div className="mt-4 flex flex-wrap gap-3">
        <Button type="submit" disabled={add.isPending}>Add the grid</Button>
        <Button onClick={onDone}>Add none</Button>
      </div>
    </form>
  );
}
