'use client';

import { useState } from 'react';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { procedureNames, procedureSources } from '@/lib/domain/assessment/explain-procedure';
import { explainPattern } from '@/lib/domain/assessment/explain-pattern';
import { explainSimilarity } from '@/lib/domain/assessment/describe-similarity';
import { explainSpacing } from '@/lib/domain/assessment/explain-spacing';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { explainTimeSteps } from '@/lib/domain/assessment/explain-time-steps';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { domainVolume } from '@/lib/domain/problems/domain-volume';
import type { Study } from '@/lib/domain/studies/schema';
import { solutionFields } from '@/lib/domain/cases/solution-fields';
import { takesFiles } from '@/lib/domain/studies/takes-files';
import { regionRows } from '@/lib/domain/assessment/region-parts';
import { AfterData } from './after-data';
import { Cautions } from './cautions';
import { CollectingSections } from './collecting-sections';
import { DefinitionSection } from './definition-section';
import { ErrorMaps } from './error-maps';
import { FigureNotes, StudyFigures } from './figures';
import { GridTable } from './grid-table';
import { GridsNotes, GridsWork } from './grids-work';
import { OutcomeTable } from './outcome-table';
import { QuantityTable, TripleTable } from './quantity-table';
import { RecheckSection } from './recheck-section';
import { RegionTable } from './region-table';
import { RunRecordSection } from './run-record';
import { SpaceTimeParts, SpaceTimeTable } from './space-time-table';
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
  const comparesFiles = takesFiles(definition);
  const [isTypingAsked, setIsTypingAsked] = useState(false);
  const isTyping = may('work.write') && (isTypingAsked || !comparesFiles || solutionFields(definition, study.problemDefinition).length > 0);
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
      {assessment && study.revision === study.currentRevision && <RecheckSection study={study} />}
      <WayOn study={study} />
      <Cautions hasOrders={study.definition.fields.length > 0} hasQuantities={study.definition.quantities.length > 0} />
    </>
  );
}

interface Numbers { outcome: number; quantities: number; triples: number; grids: number; regions: number }

function tableNumbers({ fields, quantities, spaceTime }: Assessment): Numbers {
  if (spaceTime) return { outcome: 0, quantities: 0, triples: 0, grids: 3, regions: 3 };
  const outcome = Number(fields.length > 0);
  const shown = outcome + Number(quantities.length > 0);
  const triples = shown + Number(quantities.some((quantity) => quantity.triples.length > 0));
  return { outcome, quantities: shown, triples, grids: triples + 1, regions: triples + 1 + Number(regionRows(fields).length > 0) };
}

const lastTable = (assessment: Assessment) => tableNumbers(assessment).regions;

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
              {assessment.patterns.map((pattern) => <p key={`${pattern.code} ${pattern.field}`}><b>Hint.</b> <FormulaText text={explainPattern(pattern)} symbols={fields.map(({ field }) => field)} /></p>)}
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
      {assessment.spaceTime && (
        <Section note={<SpaceTimeNotes />}>
          <SpaceTimeTable parts={assessment.spaceTime} number={1} />
          <div className="mt-8"><SpaceTimeParts parts={assessment.spaceTime} number={2} /></div>
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
      {study.definition.fields.length > 0 && (
        <Section heading="Where the error is" note={<MapNotes />}>
          {numbers.regions > numbers.grids && <div className="mb-8"><RegionTable fields={fields} thickness={study.definition.boundaryBand?.thickness} number={numbers.regions} /></div>}
          <ErrorMaps study={study} number={Number(fields.length > 0) + quantities.length + 1} />
        </Section>
      )}
    </>
  );
}

function MapNotes() {
  return (
    <>
      <p>A bin shows the largest error of the rows in it. The scale ends four decades below the largest.</p>
      <p className="screen-only">Arrow keys move the bin that is read out, Home goes back to the largest error.</p>
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

function SpaceTimeNotes() {
  return (
    <>
      <p>Norms: <Sym>E</Sym><sup>2</sup> = <Sym>A</Sym><sup>2</sup><Sym>h</Sym><sup>2<i>p</i></sup> + 2<Sym>ρAB</Sym> <Sym>h</Sym><sup><i>p</i></sup><Sym>Δt</Sym><sup><i>q</i></sup> + <Sym>B</Sym><sup>2</sup><Sym>Δt</Sym><sup>2<i>q</i></sup>, since the norm of a sum is no sum of norms.</p>
      <p>A value with a known one keeps its sign: <Sym>E</Sym> = <Sym>A</Sym><Sym>h</Sym><sup><i>p</i></sup> + <Sym>B</Sym><Sym>Δt</Sym><sup><i>q</i></sup>.</p>
      <p>± is the spread of the fit at 95 %, no confidence interval. Orders fitted together are shown and not judged.</p>
    </>
  );
}

/** Grids that are in the assessment and state a time step. */
function steppedGrids({ grids }: Study, { fields, quantities }: Assessment): { h: number; dt: number }[] {
  const placed = [...fields.flatMap((field) => field.grids), ...quantities.flatMap(({ values }) => values)];
  return grids.flatMap(({ label, dt }) => {
    const h = placed.find((each) => each.label === label)?.h;
    return h === undefined || dt === undefined ? [] : [{ h, dt }];
  });
}

function meshNotes({ grids, dimension, problemDefinition }: Study, { inputs, similarity }: Assessment): string[] {
  const around = { dimension, volume: domainVolume(problemDefinition, dimension), box: problemDefinition.domain };
  return [...explainSpacing(grids, inputs, around), ...explainSimilarity(similarity)];
}

function GridNotes({ study, assessment }: { study: Study; assessment: Assessment }) {
  const notes = study.refinement === 'time' ? [] : meshNotes(study, assessment);
  const steps = study.refinement === 'space' ? explainTimeSteps(steppedGrids(study, assessment)) : null;
  return (
    <>
      {study.grids.some((grid) => grid.upload) && <p>A hash copied gives all 64 digits. Point at it for the name of the file.</p>}
      {notes.map((note) => <p key={note}>{note}</p>)}
      {steps !== null && <p><FormulaText text={steps} symbols={['q']} /></p>}
    </>
  );
}
