'use client';

import { useState } from 'react';
import { useFieldArray } from 'react-hook-form';
import { FaultText } from '../forms/fault-text';
import { NumberField } from '../forms/number-field';
import { SelectField } from '../forms/select-field';
import { TableInput } from '../forms/table-input';
import { Cell, HeadCell } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { Button } from '../ui/button';
import { TextButton } from '../ui/text-link';
import type { CaseForm } from './case-form-type';
import { newGrid } from './case-values';
import { plannedGrids } from './planned-grids';
import { spacingNames } from './spacing-names';

interface GridPlanRowsProps { form: CaseForm; dimension: number; isUnsteady: boolean }

/** The grids a study is to run, typed one by one or as a series. */
export function GridPlanRows({ form, dimension, isUnsteady }: GridPlanRowsProps) {
  const { fields, append, remove, replace } = useFieldArray({ control: form.control, name: 'gridPlan' });
  const { register, formState: { errors } } = form;
  const spacingAs = form.watch('spacingAs');
  const [series, setSeries] = useState({ coarsest: '', ratio: '2', count: '5' });
  const planned = plannedGrids({ ...series, spacingAs, dimension });
  const spacingName = spacingNames[spacingAs];
  return (
    <div className="flex flex-col gap-6">
      <div className="grid grid-cols-3 items-end gap-x-3 gap-y-5 tablet:grid-cols-[2fr_1fr_1fr_1fr_auto] tablet:gap-x-5">
        <SelectField label="Spacing as" className="col-span-3 tablet:col-span-1" {...register('spacingAs')}>
          {Object.entries(spacingNames).map(([value, name]) => <option key={value} value={value}>{name}</option>)}
        </SelectField>
        <NumberField label="Coarsest" value={series.coarsest} onChange={(event) => setSeries({ ...series, coarsest: event.target.value })} />
        <NumberField label="Ratio" value={series.ratio} onChange={(event) => setSeries({ ...series, ratio: event.target.value })} />
        <NumberField label="Grids" value={series.count} onChange={(event) => setSeries({ ...series, count: event.target.value })} />
        <Button className="col-span-3 tablet:col-span-1" onClick={() => { if (planned) replace(planned); }} aria-disabled={planned === null || undefined}>Fill the plan</Button>
      </div>
      {fields.length > 0 && (
        <Table caption="Grid plan." hideCaption>
          <Head><tr><HeadCell>Grid</HeadCell><HeadCell num>{spacingName}</HeadCell>{isUnsteady && <HeadCell num>Time step</HeadCell>}<HeadCell><span className="sr-only">Remove</span></HeadCell></tr></Head>
          <tbody>
            {fields.map((field, place) => {
              const faults = errors.gridPlan?.[place];
              const messages = [faults?.label?.message, faults?.spacing?.message, faults?.dt?.message].filter((message) => message !== undefined);
              const name = `grid ${place + 1}`;
              return [
                <Row key={field.id}>
                  <Cell className="py-0 pr-0"><TableInput text label={`Label, ${name}`} isFaulty={faults?.label !== undefined} {...register(`gridPlan.${place}.label`)} /></Cell>
                  <Cell className="py-0 pr-0"><TableInput label={`${spacingName}, ${name}`} isFaulty={faults?.spacing !== undefined} {...register(`gridPlan.${place}.spacing`)} /></Cell>
                  {isUnsteady && <Cell className="py-0 pr-0"><TableInput label={`Time step, ${name}`} isFaulty={faults?.dt !== undefined} {...register(`gridPlan.${place}.dt`)} /></Cell>}
                  <Cell className="pl-4 align-middle"><TextButton aria-label={`Remove ${name}`} onClick={() => remove(place)}>Remove</TextButton></Cell>
                </Row>,
                messages.length > 0 && <tr key={`${field.id} fault`}><td colSpan={4} className="pb-2">{messages.map((message) => <FaultText key={message} text={message} />)}</td></tr>,
              ];
            })}
          </tbody>
        </Table>
      )}
      {errors.gridPlan?.root?.message && <FaultText text={errors.gridPlan.root.message} />}
      <p><Button onClick={() => append(newGrid)}>Add a grid</Button></p>
    </div>
  );
}
