'use client';

import { useState } from 'react';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { procedureNames, procedureSources } from '@/lib/domain/assessment/explain-procedure';
import { explainSpacing } from '@/lib/domain/assessment/explain-spacing';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import type { Study } from '@/lib/domain/studies/schema';
import { takesFiles } from '@/lib/domain/studies/takes-files';
import { AfterData } from './after-data';
import { Cautions } from './cautions';
import { CollectingSections } from './collecting-sections';
import { DefinitionSection } from './definition-section';
import { FigureNotes, StudyFigures } from './figures';
import { GridTable } from './grid-table';
import { GridsNotes, GridsWork } from './grids-work';
import { OutcomeTable } from './outcome-table';
import { QuantityTable, TripleTable } from './quantity-table';
import { RunRecordSection } from './run-record';
import { StudyMargin } from './study-margin';
import { StudyProgress } from './study-progress';
import { StudyStatement } from './study-statement';
import { summariseStudy } from './study-summary';
import { WayOn } from './way-on';
import type { Reading } from './use-study-events';

interface StudySectionsProps { study: Study; readings: ReadonlyMap<string, Reading> }

/** A study in reading order: what came out, how it is known, what it was, what may be done. */
export function StudySections({ study, readings }: StudySectionsProps) {
  const { may } = useOrganisation();
  const { assessment, definition } = study;
  const collects = study.state === 'collecting' && study.revision === study.currentRevision;
  const comparesFiles = takesFiles(definition, study.problemDefinition);
  const [isTypingAsked, setIsTypingAsked] = useState(false);
  const isTyping = may('work.write') && (isTypingAsked || !comparesFiles);
  const notes = (
    <>
      <StudyMargin study={study} />
      {assessment && <FigureNotes study={study} fields={assessment.fields} />}
      {collects && <GridsNotes study={study} />}
    </>
  );
  return (
    <>
      <Section note={notes}>
        <PageTitle under={summariseStudy(study)}>{study.case.name}</PageTitle>
        {assessment ? <StudyStatement study={study} assessment={assessment} /> : <StudyProgress study={study} readings={readings} />}
        <AfterData study={study} />
        {assessment && <StudyFigures assessment={assessment} />}
        {collects && <GridsWork study={study} readings={readings} onType={isTyping ? null : () => setIsTypingAsked(true)} />}
      </Section>
      {assessment && <Results study={study} assessment={assessment} />}
      {collects && <CollectingSections study={study} isTyping={isTyping} />}
      <DefinitionSection study={study} />
      <RunRecordSection grids={study.grids} number={assessment ? lastTable(assessment) + 1 : 1} />
      <WayOn study={study} />
      <Cautions hasOrders={study.definition.fields.length > 0} hasQuantities={study.definition.quantities.length > 0} />
    </>
  );
}

interface Numbers { outcome: number; quantities: number; triples: number; grids: number }

function tableNumbers({ fields, quantities }: Assessment): Numbers {
  const outcome = Number(fields.length > 0);
  const shown = outcome + Number(quantities.length > 0);
  const triples = shown + Number(quantities.some((quantity) => quantity.triples.length > 0));
  return { outcome, quantities: shown, triples, grids: triples + 1 };
}

const lastTable = (assessment: Assessment) => tableNumbers(assessment).grids;

function Results({ study, assessment }: { study: Study; assessment: Assessment }) {
  const { fields, quantities } = assessment;
  const numbers = tableNumbers(assessment);
  const fits = fields.filter((field) => field.counts && field.fit !== null);
  return (
    <>
      {fields.length > 0 && (
        <Section
          note={(
            <>
              <p>Grey: outside the band. Three decimals within 0.01 of a limit, else two.</p>
              {fits.length > 0 && fits.length <= 4 && (
                <p>
                  Fit over all grids used:{' '}
                  {fits.map(({ field, norm, fit }, index) => (
                    <span key={`${field} ${norm}`}>
                      {index > 0 && '; '}<NormSymbol norm={norm} /> of <Sym>{field}</Sym> {formatOrder(fit?.order ?? 0)}
                      {fit && fit.low !== null && fit.high !== null && ` (${formatOrder(fit.low)} to ${formatOrder(fit.high)})`}
                    </span>
                  ))}.
                </p>
              )}
            </>
          )}
        >
          <OutcomeTable study={study} fields={fields} number={numbers.outcome} />
        </Section>
      )}
      {quantities.length > 0 && (
        <Section note={<QuantityNotes quantities={quantities} />}>
          <QuantityTable quantities={quantities} kind={study.case.kind} number={numbers.quantities} />
          <div className="mt-8"><TripleTable quantities={quantities} number={numbers.triples} /></div>
        </Section>
      )}
      <Section note={<GridNotes study={study} assessment={assessment} />}>
        <GridTable study={study} assessment={assessment} number={numbers.grids} />
      </Section>
    </>
  );
}

function QuantityNotes({ quantities }: Pick<Assessment, 'quantities'>) {
  const used = [...new Set(quantities.map(({ procedure }) => procedure))];
  return (
    <>
      <p>Relative to the finest value. Where that is near zero the figure in the unit is the one to read.</p>
      {used.map((procedure) => <p key={procedure}><b>{procedureNames[procedure]}</b>: {procedureSources[procedure]}</p>)}
    </>
  );
}

function GridNotes({ study, assessment }: { study: Study; assessment: Assessment }) {
  const notes = study.refinement === 'time' ? [] : explainSpacing(study.grids, assessment.inputs, study.dimension);
  return (
    <>
      {study.grids.some((grid) => grid.upload) && <p>A hash copied gives all 64 digits. Point at it for the name of the file.</p>}
      {notes.map((note) => <p key={note}>{note}</p>)}
    </>
  );
}
