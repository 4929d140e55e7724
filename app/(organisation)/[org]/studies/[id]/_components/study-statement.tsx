import { Statement } from '@/app/_components/ui/page-title';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { OutcomeWord } from '@/app/_components/ui/outcome-word';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import { markOfOutcome } from '@/app/_components/studies/mark-of-outcome';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { stateOutcome } from '@/lib/domain/assessment/state-outcome';
import type { Study } from '@/lib/domain/studies/schema';
import { leadOf } from './study-lead';
import { symbolsOf } from './symbols-of';

interface StudyStatementProps { study: Study; assessment: Assessment }

/** Mark, word and one sentence with its numbers; under it what else there is to say. */
export function StudyStatement({ study, assessment }: StudyStatementProps) {
  const { outcome, sentence } = stateOutcome(assessment, study.refinement === 'time' ? 'time' : 'space');
  const symbols = symbolsOf(study);
  const counting = assessment.fields.filter((field) => field.counts);
  const isExact = counting.length > 0 && counting.every((field) => field.reasons.includes('exact'));
  const mark = markOfOutcome(outcome, { kind: study.case.kind, reasons: isExact ? ['exact'] : [] });
  const lead = leadOf(assessment, sentence);
  return (
    <Statement
      lead={(
        <>
          {lead.sentences.map((text) => <span key={text}><FormulaText text={text} symbols={symbols} /> </span>)}
          {lead.beside.map(({ field, sentence: reason }) => {
            const besideMark = markOfOutcome(field.outcome);
            return (
              <span key={`${field.field} ${field.norm}`}>
                <NormSymbol norm={field.norm} /> of <Sym>{field.field}</Sym> does not count and {field.outcome === 'fail' ? '' : 'is '}
                {besideMark && <OutcomeWord mark={besideMark} />}{field.outcome === 'fail' ? 's' : ''}: <FormulaText text={lowered(reason)} symbols={symbols} />{' '}
              </span>
            );
          })}
          {lead.more > 0 && <span>{lead.more} more {lead.more === 1 ? 'norm' : 'norms'} without weight in Table 1. </span>}
          {lead.nextStep !== null && <span className="mt-2 block"><b>Next.</b> <FormulaText text={lead.nextStep} symbols={symbols} /></span>}
        </>
      )}
    >
      {mark !== null && <><OutcomeWord large lineStart mark={mark} /> </>}
      <FormulaText text={sentence} symbols={symbols} />
    </Statement>
  );
}

/** A sentence going on after a colon; names of norms keep their capital. */
function lowered(sentence: string): string {
  return /^(L1|L2|L∞)\b/.test(sentence) ? sentence : sentence.charAt(0).toLowerCase() + sentence.slice(1);
}
