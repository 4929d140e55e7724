'use client';

import { useDeferredValue, useMemo, useState } from 'react';
import '../api/configure-zod';
import { ErrorFigure } from '../figures/error-figure';
import { ErrorFigureNote } from '../figures/error-figure-note';
import { ValueFigure } from '../figures/value-figure';
import { FormActions } from '../forms/form-actions';
import { FaultText } from '../forms/fault-text';
import { Button } from '../ui/button';
import { CopyButton } from '../ui/copy-button';
import { EmptyState } from '../ui/empty-state';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { Sym } from '../ui/symbols';
import { TextButton } from '../ui/text-link';
import { quickTsv } from './as-tsv';
import type { PastedTable } from './parse-table';
import { QuickFields } from './quick-fields';
import { QuickResult, QuickStatement } from './quick-result';
import { columnsOf, emptyQuick, exampleQuick, isBlankRow, withEmptyRow } from './quick-state';
import { readQuick } from './read-quick';
import { TableEntry } from './table-entry';

const apart = { tab: 'by tabs', semicolon: 'by semicolons', comma: 'by commas', space: 'by spaces' } as const;

function pastedWords({ rows, separator, hadHeader }: PastedTable): string {
  return `Pasted ${rows.length} row${rows.length === 1 ? '' : 's'}, apart ${apart[separator]}${hadHeader ? '; the line of names was left out' : ''}.`;
}

/** A small table, judged as it is typed. Nothing leaves the browser. */
export function QuickCheckView() {
  const [state, setState] = useState(emptyQuick);
  const [pasted, setPasted] = useState<PastedTable | null>(null);
  const reading = useMemo(() => readQuick(state), [state]);
  const shown = useDeferredValue(reading);
  const { assessment, input } = shown;
  const columns = columnsOf(state);
  const isEmpty = state.rows.every(isBlankRow);
  const clear = () => {
    setPasted(null);
    setState({ ...state, rows: withEmptyRow([], columns.length) });
  };
  return (
    <>
      <Section
        note={(
          <>
            <p><b>Computed in this page.</b> What you type does not leave your browser.</p>
            <p>A spacing may be given as <Sym>h</Sym>, as cells in all, or as cells per direction. Counts per direction read as totals would double or treble an order.</p>
            <p>A value without a known one needs three grids. Errors need four for an outcome.</p>
            {assessment && <ErrorFigureNote fields={assessment.fields} />}
          </>
        )}
      >
        <PageTitle under="Type or paste a small table; read order, extrapolated value and grid convergence index.">Quick check</PageTitle>
        {assessment && <QuickStatement assessment={assessment} />}
        <div className={`mt-6 grid gap-x-10 gap-y-8 ${state.holds === 'values' ? 'wide:grid-cols-[312px_minmax(0,1fr)]' : 'wide:grid-cols-[400px_minmax(0,1fr)]'}`}>
          <div className="min-w-0">
            <QuickFields state={state} reading={reading} onChange={setState} />
            <div className="mt-6">
              <TableEntry columns={columns} rows={state.rows} labels={reading.labels} faults={reading.cells} onChange={(rows) => setState({ ...state, rows })} onPasted={setPasted} />
            </div>
            {reading.table.map((message) => <FaultText key={message} text={message} />)}
            <p className="mt-1 min-h-5 text-note text-graphite">
              <span role="status">{pasted && pastedWords(pasted)}</span> {!isEmpty && <TextButton onClick={clear}>Clear the table</TextButton>}
            </p>
            <FormActions>
              {isEmpty && <Button onClick={() => setState(exampleQuick)}>Fill in an example</Button>}
              {assessment && <CopyButton text={() => quickTsv(state, reading.labels, assessment)}>Copy as TSV</CopyButton>}
            </FormActions>
          </div>
          <div className="min-w-0">
            {assessment?.quantities.map((quantity) => <ValueFigure key={quantity.name} quantity={quantity} />)}
            {assessment && assessment.fields.length > 0 && <ErrorFigure fields={assessment.fields} />}
            {!assessment && <EmptyState needed="Two rows show the first numbers.">The figure of the table belongs here.</EmptyState>}
          </div>
        </div>
      </Section>
      {assessment && input && <QuickResult input={input} assessment={assessment} />}
    </>
  );
}
