import { useState, type ReactNode } from 'react';
import { SelectField } from '@/app/_components/forms/select-field';
import { Sym } from '@/app/_components/ui/symbols';
import { equalWeights, mapsItself, noColumn, type Choices, type ColumnNeed } from './column-choices';
import { offeredColumns } from './offered-columns';

interface ColumnSelectsProps {
  needs: readonly ColumnNeed[];
  header: readonly string[];
  choices: Choices;
  /** Shown once somebody tried to save. */
  faults: ReadonlyMap<string, string>;
  onChoose: (key: string, column: string) => void;
}

const regionNames: Record<string, string> = { distance: 'Distance to the boundary', flag: 'Flag of boundary rows' };

function nameOf({ kind, key, field, axis }: ColumnNeed): ReactNode {
  switch (kind) {
    case 'coordinate': return <>Coordinate <Sym>{axis}</Sym></>;
    case 'time': return <>Time <Sym>t</Sym></>;
    case 'weight': return 'Weight of a row';
    case 'value': return <>Field <Sym>{field}</Sym></>;
    case 'gradient': return <>Derivative of <Sym>{field}</Sym> along <Sym>{axis}</Sym></>;
    case 'size': return <>Size of a cell along <Sym>{axis}</Sym></>;
    case 'region': return regionNames[key];
  }
}

const lackWords: Partial<Record<ColumnNeed['kind'], string>> = {
  value: 'not in the file', gradient: 'not in the file', size: 'cells of one size', region: 'no column',
};

/** A choice of column for everything that is read, grouped by what it is for. */
export function ColumnSelects(props: ColumnSelectsProps) {
  const groups: { kinds: ColumnNeed['kind'][]; name: string; hint?: string }[] = [
    { kinds: ['coordinate', 'time', 'weight', 'value'], name: 'Columns of every reading' },
    { kinds: ['gradient'], name: 'Gradients', hint: 'For H1 and energy norms: the derivatives that the solver wrote, one column for each direction.' },
    { kinds: ['size'], name: 'Sizes of cells', hint: 'The case compares averages. Where cells differ in size their columns say over what to average.' },
  ];
  return [...groups.map((group) => {
    const needs = props.needs.filter(({ kind }) => group.kinds.includes(kind));
    return needs.length > 0 && (
      <fieldset key={group.name} className="mt-6">
        <legend className="mb-2 font-serif text-group font-semibold">{group.name}</legend>
        {group.hint && <p className="mb-3 text-note text-graphite">{group.hint}</p>}
        <div className="grid gap-5 tablet:grid-cols-3">{needs.map((need) => <ColumnSelect key={need.key} need={need} {...props} />)}</div>
      </fieldset>
    );
  }), <RegionSelects key="regions" {...props} />];
}

/** Seldom needed: folded away unless a column is taken for one. */
function RegionSelects(props: ColumnSelectsProps) {
  const needs = props.needs.filter(({ kind }) => kind === 'region');
  const [isUsed] = useState(() => needs.some(({ key }) => props.choices[key] !== noColumn));
  return (
    <details open={isUsed} className="mt-6">
      <summary className="min-h-11 w-fit cursor-pointer py-2 font-serif text-group font-semibold tablet:min-h-0 tablet:py-0">Columns that tell the boundary</summary>
      <p className="mt-2 mb-3 text-note text-graphite">For norms inside and near the boundary, where the box of the problem does not tell them apart.</p>
      <div className="grid gap-5 tablet:grid-cols-3">{needs.map((need) => <ColumnSelect key={need.key} need={need} {...props} />)}</div>
    </details>
  );
}

function ColumnSelect({ need, header, choices, faults, onChoose }: ColumnSelectsProps & { need: ColumnNeed }) {
  const lack = need.mayLack && !mapsItself(need, header) ? lackWords[need.kind] : undefined;
  const chosen = choices[need.key] ?? '';
  const offered = offeredColumns(header, need.field ?? need.axis ?? need.key, chosen);
  return (
    <SelectField
      // The serif of a symbol would make its label a pixel taller than the one beside it.
      label={<span className="block h-5">{nameOf(need)}</span>} value={chosen} error={faults.get(need.key)}
      hint={offered.length < new Set(header).size ? `Offers ${offered.length} of ${header.length} columns. Another is mapped through the API.` : undefined}
      onChange={(event) => onChoose(need.key, event.target.value)}
    >
      {chosen === '' && <option value="">choose a column</option>}
      {need.kind === 'weight' && <option value={equalWeights}>equal weights</option>}
      {lack && <option value={noColumn}>{lack}</option>}
      {offered.map((column) => <option key={column} value={column}>{column}</option>)}
    </SelectField>
  );
}
