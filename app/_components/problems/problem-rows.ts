import type { ConflictRow } from '../conflict/use-conflict';
import { equationNames } from './equation-names';
import type { ProblemValues } from './problem-values';

const isTyped = ({ name, text }: { name: string; text: string }) => `${name}${text}`.trim() !== '';

/** Everything typed in a problem, one thing a row. */
export function problemRows(values: ProblemValues): ConflictRow[] {
  const domain = values.domain.slice(0, Number(values.dimension));
  return [
    { name: 'Name', text: values.name.trim() },
    { name: 'Equation', text: [equationNames[values.equation], values.form.trim()].filter(Boolean).join(', ') },
    { name: 'Dimensions', text: `${values.dimension}, ${values.unsteady ? 'unsteady' : 'steady'}` },
    ...values.exact.filter(isTyped).map(({ name, text }) => ({ name: `Exact solution of ${name.trim()}`, text: text.trim() })),
    ...values.constants.filter(isTyped).map(({ name, text }) => ({ name: `Constant ${name.trim()}`, text: text.trim() })),
    ...domain.map(({ from, to }, index) => ({ name: `Domain along ${'xyz'.charAt(index)}`, text: `${from}${to}`.trim() === '' ? '' : `${from.trim()} to ${to.trim()}` })),
  ];
}
