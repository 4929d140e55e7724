import type { ConflictRow } from '../conflict/use-conflict';
import { isBlankGrid, isDeclared } from './case-definition';
import type { CaseValues, FieldValues, GridValues, NormValues, QuantityValues } from './case-values';
import { spacingNames } from './spacing-names';

const samplingNames = { point: 'values at points', average: 'cell averages', quadrature: 'values at quadrature points' } as const;

const stated = (parts: readonly (readonly [string, string])[]) => parts.filter(([, text]) => text.trim() !== '').map(([name, text]) => `${name} ${text.trim()}`).join(', ');

function normText(norm: NormValues): string {
  const numbers = stated([
    ['order', norm.formalOrder], ['tolerance', norm.tolerance], ['derived order', norm.derivedOrder], ['regularity', norm.regularity],
    ['log factor', norm.logFactor], ['exact limit', norm.exactLimit],
  ]);
  return [norm.norm, numbers, norm.counts ? '' : 'does not count'].filter(Boolean).join(', ');
}

const fieldRow = ({ field, citation, norms }: FieldValues): ConflictRow => (
  { name: `Field ${field.trim()}`, text: [...norms.filter(isDeclared).map(normText), stated([['source', citation]])].filter(Boolean).join('\n') }
);

const quantityRow = ({ name, unit, formalOrder, knownValue, target, procedure, uNumFactor }: QuantityValues): ConflictRow => (
  { name: `Quantity ${name.trim()}`, text: stated([['unit', unit], ['order', formalOrder], ['known value', knownValue], ['target', target], ['procedure', procedure], ['factor', uNumFactor]]) }
);

const gridText = ({ label, spacing, dt }: GridValues) => [label.trim(), spacing.trim(), stated([['dt', dt]])].filter(Boolean).join(', ');

/** Everything typed in a case, one thing a row. */
export function caseRows(values: CaseValues): ConflictRow[] {
  return [
    { name: 'Name', text: values.name.trim() },
    { name: 'Problem', text: values.problem },
    { name: 'Options', text: values.options.filter(({ name, text }) => `${name}${text}`.trim() !== '').map(({ name, text }) => `${name.trim()}: ${text.trim()}`).join('\n') },
    ...values.fields.map(fieldRow),
    ...values.quantities.map(quantityRow),
    { name: 'Output', text: values.sampling === '' ? '' : samplingNames[values.sampling] },
    { name: 'Source terms', text: values.sourceSampling === '' ? '' : samplingNames[values.sourceSampling] },
    { name: 'Degree of elements', text: values.elementDegree },
    { name: 'Grids an outcome needs', text: values.minimumGrids.trim() },
    { name: 'Grid plan', text: [values.gridPlan.length > 0 ? spacingNames[values.spacingAs] : '', ...values.gridPlan.filter((grid) => !isBlankGrid(grid)).map(gridText)].filter(Boolean).join('\n') },
    { name: 'Requirements', text: values.requirements.trim() },
  ];
}
