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
import type { RejectionCode } from '@/lib/domain/uploads/rejection';
import type { Study } from '@/lib/domain/studies/schema';
import { ColumnForm } from './column-form';

/** A file rejected for one of these is no table whose columns could be told otherwise. */
const beforeColumns = new Set<RejectionCode>(['empty-file', 'unsupported-format', 'binary-content', 'damaged-gzip', 'damaged-file', 'expands-too-far', 'too-many-columns', 'malformed-json', 'checksum-differs']);

/** Which column of the solver's files is what: asked once for the case, shown and changed here later. */
export function ColumnsSection({ study }: { study: Study }) {
  const { slug, may } = useOrganisation();
  const [isChanging, setIsChanging] = useState(false);
  const included = study.grids.filter(({ excluded }) => excluded === null);
  const waiting = included.filter(({ state }) => state === 'needs-columns');
  const rejected = included.filter(({ state, upload }) => state === 'rejected' && upload && !upload.reasons.some(({ code }) => beforeColumns.has(code)));
  const files = [...waiting, ...rejected, ...study.grids.filter(({ upload, state }) => upload && state !== 'receiving')];
  const upload = waiting.length > 0 || isChanging ? files[0]?.upload : undefined;
  const preview = useApi(previewContract, { organisation: slug, params: { id: upload?.id ?? '' } }, { enabled: Boolean(upload) });
  const { columns } = study.case;
  if (waiting.length === 0 && columns === null && rejected.length === 0) return null;
  const isOpen = upload !== undefined && upload !== null;
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
              key={upload.id} study={study} preview={found} upload={upload} mayCancel={waiting.length === 0}
              waiting={waiting.map(({ label }) => label)} rejected={rejected.map(({ label }) => label)} onDone={() => setIsChanging(false)}
            />
          )}
        </Answered>
      )}
      {!isOpen && columns !== null && <div className="max-w-[420px]"><ColumnsTable columns={columns} /></div>}
      {!isOpen && columns === null && <p>The columns were found by their names.</p>}
      {!isOpen && may('work.write') && files.length > 0 && <div className="mt-4"><Button onClick={() => setIsChanging(true)}>Change columns</Button></div>}
    </Section>
  );
}
