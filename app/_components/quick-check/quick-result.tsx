'use client';

import { estimatedBand } from '@/lib/domain/assessment/estimated-band';
import { explainPattern } from '@/lib/domain/assessment/explain-pattern';
import { explainProcedure, procedureNames, procedureSources } from '@/lib/domain/assessment/explain-procedure';
import { explainField, explainQuantity } from '@/lib/domain/assessment/reason-text';
import { stateOutcome } from '@/lib/domain/assessment/state-outcome';
import type { QuickCheckInput } from '@/lib/domain/assessment/quick-schema';
import type { SeriesAssessment } from '@/lib/numerics/assessment';
import { markOfOutcome } from '../studies/mark-of-outcome';
import { FormulaText } from '../ui/formula-text';
import { OutcomeWord } from '../ui/outcome-word';
import { Statement } from '../ui/page-title';
import { Section } from '../ui/section';
import { NormSymbol } from '../ui/symbols';
import { NormTable } from './norm-table';
import { ValueTable } from './value-table';

/** The result in a sentence. */
export function QuickStatement({ assessment }: { assessment: SeriesAssessment }) {
  const { outcome, sentence } = stateOutcome(assessment, 'space');
  const mark = markOfOutcome(outcome, { reasons: assessment.fields.length > 0 && assessment.fields.every(({ reasons }) => reasons.includes('exact')) ? ['exact'] : [] });
  return (
    <Statement>
      {mark && <><OutcomeWord large lineStart mark={mark} /> </>}
      <FormulaText text={sentence} symbols={assessment.fields.map(({ field }) => field)} />
    </Statement>
  );
}

interface QuickResultProps { input: QuickCheckInput; assessment: SeriesAssessment }

/** The numbers behind the sentence, why the outcome is what it is, and what to do next. */
export function QuickResult({ input, assessment }: QuickResultProps) {
  const { fields, quantities } = assessment;
  const symbols = fields.map(({ field }) => field);
  const explanations = [
    ...fields.flatMap((field) => explainField(field).map((text) => ({ ...text, norm: fields.length > 1 ? field.norm : null }))),
    ...quantities.flatMap(explainQuantity).map((text) => ({ ...text, norm: null })),
  ];
  const [quantity] = quantities;
  const note = quantity
    ? <><p><b>{procedureNames[quantity.procedure]}</b>: {procedureSources[quantity.procedure]}</p><p>The {estimatedBand(quantity).longName} covers the error in about 95 % of cases by experience. It is no bound.</p></>
    : (
      <>
        <p>The <b>band</b> reaches from the tolerance below the formal order to twice the tolerance above it; the last two orders must lie in it.</p>
        {assessment.patterns.map((pattern) => <p key={pattern.code}><b>Hint.</b> <FormulaText text={explainPattern(pattern)} symbols={symbols} /></p>)}
      </>
    );
  return (
    <Section heading="Result" note={note}>
      {quantities.map((quantity) => <ValueTable key={quantity.name} input={input} quantity={quantity} />)}
      {fields.length > 0 && <NormTable fields={fields} />}
      {explanations.length > 0 && (
        <ul className="mt-4 flex max-w-[46em] flex-col gap-2 font-serif text-[16px] leading-6">
          {quantities.map((each) => <li key={each.name}><FormulaText text={explainProcedure(each)} symbols={['p', 'h']} /></li>)}
          {explanations.map(({ norm, sentence, nextStep }) => <li key={`${norm} ${sentence}`}>{norm && <><NormSymbol norm={norm} />: </>}<FormulaText text={sentence} symbols={symbols} /> <FormulaText text={nextStep} symbols={symbols} /></li>)}
        </ul>
      )}
    </Section>
  );
}
