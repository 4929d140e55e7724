'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { apiKey } from '@/app/_components/api/api-key';
import { callApi } from '@/app/_components/api/call-api';
import { problemOf } from '@/app/_components/api/problem-of';
import { ProblemNotice } from '@/app/_components/forms/problem-notice';
import { SelectField } from '@/app/_components/forms/select-field';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { Cell, HeadCell } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { Button } from '@/app/_components/ui/button';
import { Sym } from '@/app/_components/ui/symbols';
import { joinWords } from '@/lib/domain/assessment/series-name';
import { putColumnsContract } from '@/lib/domain/cases/schema';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import type { UploadPreview } from '@/lib/domain/uploads/schema';
import { getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { columnNeeds, equalWeights, firstChoices, mappingOf, type ColumnNeed } from './column-choices';

interface ColumnFormProps { study: Study; preview: UploadPreview; filename: string; waiting: readonly string[]; mayCancel: boolean; onDone: () => void }

const shownRows = 4;

function nameOf({ key, kind }: ColumnNeed) {
  // The serif name would make its label a pixel taller than the one beside it.
  if (kind === 'weight') return <span className="block h-5">Weight of a row</span>;
  return <span className="block h-5">{kind === 'field' ? 'Field' : 'Coordinate'} <Sym>{key.replace('field ', '')}</Sym></span>;
}

/** The first rows of a file, and a choice for everything that must have a column. */
export function ColumnForm({ study, preview, filename, waiting, mayCancel, onDone }: ColumnFormProps) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const needsTime = study.problemDefinition.unsteady && study.grids.some((grid) => grid.t === undefined && grid.excluded === null);
  const needs = columnNeeds({ dimension: study.problemDefinition.dimension, needsTime, fields: study.definition.fields.map(({ field }) => field) });
  const [choices, setChoices] = useState(() => firstChoices(needs, preview));
  const [areFaultsShown, setAreFaultsShown] = useState(false);
  const mapping = mappingOf(choices, preview.mapping);
  const save = useMutation({
    mutationFn: (body: ColumnMapping) => callApi(putColumnsContract, { organisation: slug, params: { case: study.case.id }, body }),
    onSuccess: async () => { await queries.invalidateQueries({ queryKey: apiKey(getStudyContract) }); onDone(); },
  });
  return (
    <form
      aria-label="Columns" noValidate
      onSubmit={(event) => { event.preventDefault(); setAreFaultsShown(true); if (mapping) save.mutate(mapping); }}
    >
      <Table caption={`The first rows of ${filename}. ${preview.dialect}.`}>
        <Head><tr>{preview.header.map((column, index) => <HeadCell key={`${column} ${index}`} num className="whitespace-nowrap">{column}</HeadCell>)}</tr></Head>
        <tbody>
          {preview.firstRows.slice(0, shownRows).map((row, index) => (
            <Row key={index}>{row.map((cell, column) => <Cell key={column} num>{cell}</Cell>)}</Row>
          ))}
        </tbody>
      </Table>
      <div className="mt-6 grid gap-5 tablet:grid-cols-3">
        {needs.map((need) => (
          <SelectField
            key={need.key} label={nameOf(need)} value={choices[need.key] ?? ''}
            error={areFaultsShown && choices[need.key] === '' ? 'No column. Choose the one that holds it.' : undefined}
            onChange={(event) => setChoices({ ...choices, [need.key]: event.target.value })}
          >
            <option value="">choose a column</option>
            {need.kind === 'weight' && <option value={equalWeights}>equal weights</option>}
            {preview.header.map((column, index) => <option key={`${column} ${index}`} value={column}>{column}</option>)}
          </SelectField>
        ))}
      </div>
      <ProblemNotice problem={problemOf(save.error, 'Not saved')} />
      <div className="mt-4 flex flex-wrap items-center gap-3">
        <Button type="submit" kind="primary" disabled={save.isPending}>{waiting.length > 0 ? 'Save columns and read' : 'Save columns'}</Button>
        {mayCancel && <Button onClick={onDone}>Keep them as they are</Button>}
        {waiting.length > 0 && <span className="text-note text-graphite">{waiting.length === 1 ? 'Grid' : 'Grids'} {joinWords([...waiting].reverse())} {waiting.length === 1 ? 'waits' : 'wait'} for it.</span>}
      </div>
    </form>
  );
}
