import type { FieldAssessment } from '@/lib/numerics/assessment';
import { spansRatio } from '@/lib/numerics/spacing/spans-ratio';
import { formatRatio } from '../numbers/format-ratio';
import type { Explanation } from './explanation';
import type { FieldFacts } from './field-facts';
import { joinWords } from './series-name';

const floors = { 'round-off': 'round-off', 'known-error': 'no more than 20 times its known error' } as const;

/** Why the grids do not suffice: some lie on the floor, the span or the pairs are short, or the case asks for more. */
export function explainTooFewGrids({ name, used, unused }: FieldFacts, { grids, orders, comparedTo }: FieldAssessment): Explanation {
  if (grids.length === 0) return { sentence: `No grid has ${name}.`, nextStep: 'Upload the output of the grids, or state the errors.' };
  const floor = joinWords([...new Set(unused.flatMap((grid) => grid.unusedReason ?? []))].map((reason) => {
    const labels = unused.filter((grid) => grid.unusedReason === reason).map((grid) => grid.label).reverse();
    return `${name} is ${floors[reason]} on ${joinWords(labels)}`;
  }));
  const extra = comparedTo === undefined ? 0 : 1;
  const all = used.length + extra;
  const counted = floor
    ? `${grids.length - unused.length + extra} of ${grids.length + extra} grids can be used, because ${floor}`
    : `There ${all === 1 ? 'is 1 grid' : `are ${all} grids`}`;
  const spacings = [...used.map((grid) => grid.h), ...(comparedTo === undefined ? [] : [comparedTo.h])];
  const shortfall = used.length >= 2 && !spansRatio(spacings)
    ? `their spacings span a ratio of ${formatRatio((spacings.at(-1) ?? 1) / (spacings[0] ?? 1))}, where 2 is needed`
    : orders.length < 2
      ? `${used.length === 1 ? 'it gives' : 'they give'} ${orders.length === 1 ? '1 pair' : 'no pair'} at a ratio of 1.3 or more, where two pairs are needed`
      : 'more are asked for';
  return {
    sentence: `${counted}; ${shortfall}.`,
    nextStep: floor
      ? 'Converge the finest grids further or store more digits so that they count, or add grids between the coarse ones at a ratio of 1.3 or more.'
      : 'Add a grid, finer than the finest by a ratio of 1.3 or more.',
  };
}
