'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { apiKey } from '@/app/_components/api/api-key';
import { callApi } from '@/app/_components/api/call-api';
import { problemOf } from '@/app/_components/api/problem-of';
import { useApi } from '@/app/_components/api/use-api';
import { ProblemNotice } from '@/app/_components/forms/problem-notice';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { Button } from '@/app/_components/ui/button';
import { joinWords } from '@/lib/domain/assessment/series-name';
import { putColumnsContract } from '@/lib/domain/cases/schema';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { refuseDialect, type GivenDialect } from '@/lib/domain/columns/given-dialect';
import { previewContract, type UploadPreview } from '@/lib/domain/uploads/schema';
import { getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { choiceFaults, columnNeeds, firstChoices, mappingOf } from './column-choices';
import { ColumnSelects } from './column-selects';
import { DialectChoices, dialectQuery } from './dialect-choices';
import { PreviewTable } from './preview-table';

interface ColumnFormProps {
  study: Study; upload: { id: string; filename: string };
  /** The file as the columns of the case have it. */
  preview: UploadPreview;
  waiting: readonly string[];
  rejected: readonly string[];
  mayCancel: boolean;
  onDone: () => void;
}

const gridsAre = (labels: readonly string[], one: string, several: string) => `${labels.length === 1 ? 'Grid' : 'Grids'} ${joinWords([...labels].reverse())} ${labels.length === 1 ? one : several}`;

/** The file as it would be read; the one in force while nothing else was said. */
function usePreview({ upload, preview }: Pick<ColumnFormProps, 'upload' | 'preview'>, said: GivenDialect | null) {
  const { slug } = useOrganisation();
  const isSound = said !== null && refuseDialect(said) === null;
  const asked = useApi(previewContract, { organisation: slug, params: { id: upload.id }, query: dialectQuery(said ?? {}) }, { enabled: isSound, keepsAnswer: true });
  return { shown: isSound ? (asked.data ?? preview) : preview, isPending: isSound && asked.isFetching, error: isSound ? asked.error : null };
}

/** The first rows of a file, how it is written, and a choice for everything that must have a column. */
export function ColumnForm({ study, upload, preview, waiting, rejected, mayCancel, onDone }: ColumnFormProps) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const { problemDefinition: problem, definition } = study;
  const needsTime = problem.unsteady && study.grids.some((grid) => grid.t === undefined && grid.excluded === null);
  const needs = useMemo(() => columnNeeds({ dimension: problem.dimension, needsTime, definition }), [problem.dimension, needsTime, definition]);
  const [said, setSaid] = useState<GivenDialect | null>(null);
  const { shown, isPending, error } = usePreview({ upload, preview }, said);
  const [picked, setPicked] = useState<Record<string, string>>({});
  const [areFaultsShown, setAreFaultsShown] = useState(false);
  const table = said ?? preview.mapping?.table ?? {};
  // What was picked stays under another way of reading the table, as far as that has the column.
  const kept = Object.fromEntries(Object.entries(picked).filter(([, column]) => column.startsWith(' ') || shown.header.includes(column)));
  const choices = { ...firstChoices(needs, shown), ...kept };
  const mapping = refuseDialect(table) === null && !isPending ? mappingOf(needs, { choices, kept: preview.mapping, table }) : null;
  const save = useMutation({
    mutationFn: (body: ColumnMapping) => callApi(putColumnsContract, { organisation: slug, params: { case: study.case.id }, body }),
    onSuccess: async () => {
      await Promise.all([getStudyContract, previewContract].map((contract) => queries.invalidateQueries({ queryKey: apiKey(contract) })));
      onDone();
    },
  });
  const isRead = waiting.length + rejected.length > 0;
  return (
    <form
      aria-label="Columns" noValidate
      onSubmit={(event) => { event.preventDefault(); setAreFaultsShown(true); if (mapping) save.mutate(mapping); }}
    >
      <PreviewTable preview={shown} filename={upload.filename} />
      {shown.table && <DialectChoices table={shown.table} given={table} onChange={setSaid} />}
      <ProblemNotice problem={problemOf(error, 'Not read')} />
      <ColumnSelects
        needs={needs} header={shown.header} choices={choices} faults={areFaultsShown ? choiceFaults(needs, choices) : new Map()}
        onChoose={(key, column) => setPicked({ ...picked, [key]: column })}
      />
      <ProblemNotice problem={problemOf(save.error, 'Not saved')} />
      <div className="mt-6 flex flex-wrap items-center gap-3">
        <Button type="submit" kind="primary" disabled={save.isPending || isPending}>{isRead ? 'Save columns and read' : 'Save columns'}</Button>
        {mayCancel && <Button onClick={onDone}>Keep them as they are</Button>}
        <span className="text-note text-graphite">
          {waiting.length > 0 && `${gridsAre(waiting, 'waits', 'wait')} for it. `}
          {rejected.length > 0 && `${gridsAre(rejected, 'is', 'are')} read again.`}
        </span>
      </div>
    </form>
  );
}
