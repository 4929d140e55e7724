import { checkCase } from '@/lib/domain/cases/check-case';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { createCaseSchema, type CreateCaseInput } from '@/lib/domain/cases/schema';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';
import { issuesOf, type Checked } from '../forms/checked-resolver';
import { typedNumber } from '../forms/typed-number';
import type { CaseValues, FieldValues, GridValues, NormValues, SpacingAs } from './case-values';

const someText = (text: string) => (text.trim() === '' ? undefined : text.trim());

/** A norm belongs to the case where it was declared before, or where something about it was typed. */
export const isDeclared = ({ kept, formalOrder, counts }: NormValues) => kept !== null || formalOrder.trim() !== '' || counts;

function declaredNorm(norm: NormValues, field: FieldValues, isExactness: boolean) {
  const citation = someText(field.citation);
  return {
    ...norm.kept, norm: norm.norm, counts: norm.counts,
    formalOrder: typedNumber(norm.formalOrder), tolerance: typedNumber(norm.tolerance), derivedOrder: typedNumber(norm.derivedOrder),
    regularity: typedNumber(norm.regularity), logFactor: typedNumber(norm.logFactor), exactLimit: typedNumber(norm.exactLimit),
    expectExact: isExactness ? true : (norm.kept?.expectExact ?? false),
    backing: citation === undefined ? undefined : { citation },
  };
}

function cellsPerDirection(text: string): unknown {
  const counts = text.split(/[\s,;x×*]+/i).filter(Boolean).map(typedNumber);
  return counts.length > 1 ? counts : counts[0];
}

function plannedGrid({ kept, label, spacing, dt }: GridValues, spacingAs: SpacingAs) {
  const stated = spacingAs === 'cellsPerDirection' ? cellsPerDirection(spacing) : typedNumber(spacing);
  return { ...kept, label: label.trim(), [spacingAs]: stated, dt: typedNumber(dt) };
}

export const isBlankGrid = ({ label, spacing, dt }: GridValues) => `${label}${spacing}${dt}`.trim() === '';

/** What the form would send, not yet checked. */
function typedCase(values: CaseValues): unknown {
  const options = values.options.filter(({ name, text }) => `${name}${text}`.trim() !== '').map(({ name, text }) => [name.trim(), text.trim()] as const);
  return {
    code: values.code, problem: values.problem, name: values.name, slug: someText(values.slug), kind: values.kind,
    options: Object.fromEntries(options) as Record<string, string>,
    fields: values.kind === 'solution' ? [] : values.fields.map((field) => ({
      ...field.kept, field: field.field.trim(), compare: someText(field.compare), datum: field.datum,
      norms: field.norms.filter(isDeclared).map((norm) => declaredNorm(norm, field, values.kind === 'exactness')),
    })),
    quantities: values.quantities.map(({ kept, name, unit, formalOrder, knownValue, target, procedure, uNumFactor }) => ({
      ...kept, name, unit: someText(unit), formalOrder: typedNumber(formalOrder), knownValue: typedNumber(knownValue), target: typedNumber(target),
      procedure, uNumFactor: typedNumber(uNumFactor),
    })),
    sampling: values.sampling === '' ? undefined : values.sampling, sourceSampling: values.sourceSampling === '' ? undefined : values.sourceSampling,
    elements: values.elementDegree === '' ? undefined : { degree: Number(values.elementDegree) }, minimumGrids: typedNumber(values.minimumGrids),
    gridPlan: values.gridPlan.filter((grid) => !isBlankGrid(grid)).map((grid) => plannedGrid(grid, values.spacingAs)),
    requirements: values.requirements.split('\n').map((line) => line.trim()).filter(Boolean),
  };
}

/** Checks a case as the server will: its shape, then against its problem. */
export function checkCaseValues(values: CaseValues, problem: ProblemDefinition | undefined): Checked<CreateCaseInput> {
  const parsed = createCaseSchema.safeParse(typedCase(values));
  if (parsed.success) {
    const faults = problem ? checkCase(parsed.data, problem, parsed.data.kind) : [];
    return faults.length === 0 ? { ok: true, typed: parsed.data } : { ok: false, faults };
  }
  // What is declared is checked as it is typed, also while the name is still missing.
  const definition = caseDefinitionSchema.loose().safeParse(typedCase(values));
  return { ok: false, faults: [...issuesOf(parsed.error), ...(definition.success && problem ? checkCase(definition.data, problem, values.kind) : [])] };
}
