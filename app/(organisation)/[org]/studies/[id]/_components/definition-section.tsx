import { ExactFormula } from '@/app/_components/problems/exact-formula';
import { equationNames } from '@/app/_components/problems/equation-names';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { Section } from '@/app/_components/ui/section';
import { Sym } from '@/app/_components/ui/symbols';
import { TextLink } from '@/app/_components/ui/text-link';
import { explainSampling } from '@/lib/domain/cases/explain-sampling';
import { variablesOf } from '@/lib/domain/problems/variables';
import type { Study } from '@/lib/domain/studies/schema';

const samplingWords = { point: 'Values are point values.', average: 'Values are cell averages.', quadrature: 'Values are at quadrature points.' } as const;

function describeProblem({ problemDefinition: { equation, form, dimension, unsteady } }: Study): string {
  const name = equation === 'none' ? 'No equation stated' : `Equation: ${equationNames[equation]}${form ? `, ${form}` : ''}`;
  return `${name}; ${dimension} dimension${dimension === 1 ? '' : 's'}, ${unsteady ? 'unsteady' : 'steady'}.`;
}

/** What was solved and what it is compared with, as this revision is bound to it. */
export function DefinitionSection({ study }: { study: Study }) {
  const { slug } = useOrganisation();
  const { problemDefinition, definition } = study;
  const variables = variablesOf(problemDefinition);
  const domain = Object.entries(problemDefinition.domain ?? {});
  const options = Object.entries(definition.options);
  return (
    <Section
      heading="Definition"
      note={(
        <>
          <p><b>Case revision {study.case.revision}</b>, the one this study is bound to. The case is now at revision {study.case.currentRevision}.</p>
          <p><TextLink href={`/${slug}/problems/${study.problem.slug}`}>{study.problem.name}</TextLink>, revision {study.problem.revision}.</p>
        </>
      )}
    >
      <p>
        {describeProblem(study)}
        {domain.length > 0 && <> Domain: {domain.map(([axis, interval], index) => interval && <span key={axis}>{index > 0 && ', '}<Sym>{axis}</Sym> from {interval[0]} to {interval[1]}</span>)}.</>}
        {definition.sampling && ` ${samplingWords[definition.sampling]}`}
        {definition.elements && ` Finite elements of degree ${definition.elements.degree}.`}
      </p>
      {explainSampling(definition).map((note) => <p key={note}><FormulaText text={note} symbols={['h']} /></p>)}
      {Object.entries(problemDefinition.exact ?? {}).map(([name, text]) => <ExactFormula key={name} name={name} text={text} of={variables} />)}
      {Object.entries(problemDefinition.constants).map(([name, text]) => <ExactFormula key={name} name={name} text={String(text)} />)}
      {options.length > 0 && <p>Options: {options.map(([name, value]) => `${name} ${value}`).join(', ')}.</p>}
      {definition.requirements.length > 0 && <p>Requirements: {definition.requirements.join(', ')}.</p>}
    </Section>
  );
}
