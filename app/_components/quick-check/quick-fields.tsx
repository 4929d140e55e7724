'use client';

import { procedureNames } from '@/lib/domain/assessment/explain-procedure';
import { procedures } from '@/lib/numerics/assessment';
import { NumberField } from '../forms/number-field';
import { SelectField } from '../forms/select-field';
import { TextField } from '../forms/text-field';
import type { QuickReading } from './read-quick';
import { columnsOf, spacingColumns, withEmptyRow, type QuickState } from './quick-state';

interface QuickFieldsProps { state: QuickState; reading: QuickReading; onChange: (state: QuickState) => void }

/** What the table holds and what it is held to. */
export function QuickFields({ state, reading, onChange }: QuickFieldsProps) {
  const set = (part: Partial<QuickState>) => {
    const next = { ...state, ...part };
    onChange({ ...next, rows: withEmptyRow(next.rows, columnsOf(next).length) });
  };
  const holdsValues = state.holds === 'values';
  return (
    <div className="grid grid-cols-2 gap-x-3 gap-y-5">
      <SelectField label="The table holds" className="col-span-2" value={state.holds} onChange={(event) => set({ holds: event.target.value === 'errors' ? 'errors' : 'values' })}>
        <option value="values">values of a quantity</option><option value="errors">errors by norm</option>
      </SelectField>
      <SelectField
        label="Spacing as" className="col-span-2" value={state.spacingAs}
        onChange={(event) => set({ spacingAs: (['h', 'cells', 'cellsPerDirection'] as const).find((each) => each === event.target.value) ?? 'h' })}
      >
        {Object.entries(spacingColumns).map(([value, name]) => <option key={value} value={value}>{name.charAt(0).toLowerCase() + name.slice(1)}</option>)}
      </SelectField>
      {state.spacingAs !== 'h' && (
        <SelectField label="Dimensions" value={state.dimension} onChange={(event) => set({ dimension: (['1', '2', '3'] as const).find((each) => each === event.target.value) ?? '1' })}>
          <option>1</option><option>2</option><option>3</option>
        </SelectField>
      )}
      <NumberField label="Formal order" value={state.formalOrder} error={reading.fields.formalOrder} onChange={(event) => set({ formalOrder: event.target.value })} />
      <TextField label={holdsValues ? 'Quantity' : 'Field'} autoComplete="off" value={state.name} onChange={(event) => set({ name: event.target.value })} />
      {holdsValues && (
        <SelectField label="Procedure" className="col-span-2" value={state.procedure} onChange={(event) => set({ procedure: procedures.find((each) => each === event.target.value) ?? 'three-grid' })}>
          {procedures.map((each) => <option key={each} value={each}>{procedureNames[each].toLowerCase()}</option>)}
        </SelectField>
      )}
      {holdsValues && <NumberField label="Known value, if any" value={state.knownValue} error={reading.fields.knownValue} onChange={(event) => set({ knownValue: event.target.value })} />}
      {holdsValues && <NumberField label="Largest GCI or U, if any" hint="A fraction: 0.02 is 2 %." value={state.target} error={reading.fields.target} onChange={(event) => set({ target: event.target.value })} />}
    </div>
  );
}
