'use client';

import { useState } from 'react';
import { Answered } from '@/app/_components/api/answered';
import { useApi } from '@/app/_components/api/use-api';
import { ColumnsTable } from '@/app/_components/cases/columns-table';
import { NeedsEngineer } from '@/app/_components/organisation/needs-engineer';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { Button } from '@/app/_components/ui/button';
import { Section } from '@/app/_components/ui/section';
import { previewContract } from '@/lib/domain/uploads/schema';
import type { Study } from '@/lib/domain/studies/schema';
import { ColumnForm } from './column-form';

/** Which column of the solver's files is what: asked once for the case, shown and changed here later. */
export function ColumnsSection({ study }: { study: Study }) {
  const { slug, may } = useOrganisation();
  const [isChanging, setIsChanging] = useState(false);
  const waiting = study.grids.filter((grid) => grid.state === 'needs-columns' && grid.excluded === null);
  const shown = waiting[0]?.upload ?? (isChanging ? study.grids.find((grid) => grid.upload && grid.state !== 'receiving')?.upload : undefined);
  const preview = useApi(previewContract, { organisation: slug, params: { id: shown?.id ?? '' } }, { enabled: Boolean(shown) });
  const { columns } = study.case;
  if (waiting.length === 0 && columns === null) return null;
  const isOpen = Boolean(shown) && (waiting.length > 0 || isChanging);
  return (
    <Section
      id="columns" heading="Columns"
      note={<p>Asked once for the case and remembered. Names that match are proposed; <b>equal weights</b> are never assumed.</p>}
    >
      {isOpen && !may('work.write') && <NeedsEngineer what="map columns" />}
      {isOpen && may('work.write') && (
        <Answered query={preview}>
          {(found) => (
            <ColumnForm
              key={shown?.id} study={study} preview={found} waiting={waiting.map(({ label }) => label)} filename={shown?.filename ?? ''}
              onDone={() => setIsChanging(false)} mayCancel={waiting.length === 0}
            />
          )}
        </Answered>
      )}
      {!isOpen && columns !== null && (
        <>
          <div className="max-w-[420px]"><ColumnsTable columns={columns} /></div>
          {may('work.write') && study.grids.some((grid) => grid.upload && grid.state !== 'receiving') && <div className="mt-4"><Button onClick={() => setIsChanging(true)}>Change columns</Button></div>}
        </>
      )}
    </Section>
  );
}
