import { aitkenLimit } from '@/lib/numerics/outcome/aitken-limit';
import type { FieldAssessment, FieldGrid, ReasonCode } from '@/lib/numerics/assessment';
import { formatOrder } from '../numbers/format-order';
import { formatValue } from '../numbers/format-value';
import { describeDissimilar } from './describe-similarity';
import { explainQuadrature } from './explain-quadrature';
import type { Explanation } from './explanation';
import { explainTooFewGrids } from './explain-too-few-grids';
import { shownUncertainty, type FieldFacts } from './field-facts';
import { capitalise } from './series-name';

type FieldText = (facts: FieldFacts, field: FieldAssessment) => Explanation;

const nothingMore = 'Nothing more is needed for this norm.';
const addFiner = 'Add a finer grid.';
const lowerOrderPart = 'Look for a part of the scheme that is of lower order: a boundary closure, a limiter, a correction left out, the time step.';
/** Below this the error as good as stands still: another kind of mistake than a low order. */
const standsStill = 0.5;

export const fieldReasons: Partial<Record<ReasonCode, FieldText>> = {
  exact: ({ Name, errorOf }, { grids }) => ({
    sentence: `${Name} is ${errorOf(largest(grids))} at most, which is within what counts as exact, as the case expects.`,
    nextStep: nothingMore,
  }),
  'exact-not-declared': ({ Name, errorOf }, { grids }) => ({
    sentence: `${Name} is ${errorOf(largest(grids))} at most, which counts as exact: it shows no order, and the case does not expect an exact result.`,
    nextStep: 'Say in the case that an exact result is expected, or choose a solution the scheme does not reproduce exactly.',
  }),
  'not-exact': ({ Name, errorOf }, { grids }) => ({
    sentence: `${Name} is ${errorOf(largest(grids))} on grid ${largest(grids)?.label ?? '–'}, where the case expects an exact result.`,
    nextStep: 'Look for the term, boundary value or unit that differs from the exact solution, or check whether the scheme should reproduce it. Where the exact values are zero, state a reference size to tell round-off by.',
  }),
  'too-few-grids': explainTooFewGrids,
  'above-formal': ({ last, highest, claimed }) => ({
    sentence: `The finest pair shows order ${last}, above ${highest}: more than ${claimed} explains.`,
    nextStep: `${addFiner} A change of sign or a cancellation passes with refinement; a higher order that can be derived may be declared as derived order.`,
  }),
  'errors-rise': ({ used, errorOf }) => ({
    sentence: `The orders lie in their band, but the errors of the three finest grids do not fall: ${used.slice(0, 3).reverse().map(errorOf).join(', ')}.`,
    nextStep: 'Check the two finest grids: iteration, settings and mesh. Then run them again or add a finer one.',
  }),
  departing: ({ last, before, formal, gap, orders }) => ({
    sentence: `Orders ${before} and ${last} lie in their band but leave it: their distance from ${formal} grows from ${gap(orders.at(-2))} to ${gap(orders.at(-1))}.`,
    nextStep: `${addFiner} A term of lower order may be about to show.`,
  }),
  'in-band': ({ last, before, band }) => ({
    sentence: `The last two pairs show orders ${before} and ${last}, both within ${band}.`,
    nextStep: nothingMore,
  }),
  'one-pair-only': ({ last, before, band }) => ({
    sentence: `Of the last two pairs only the finest lies surely in the band of ${band}: order ${last}, after ${before}. Two consecutive pairs are needed.`,
    nextStep: addFiner,
  }),
  'limit-below-formal': ({ last, lowest, orders }) => ({
    sentence: `The orders climb by shrinking steps to ${last} and are heading for about ${printLimit(orders)}, below ${lowest}.`,
    nextStep: lowerOrderPart,
  }),
  climbing: ({ last, before, lowest, formal }) => ({
    sentence: `The orders still climb towards ${formal}: ${before}, then ${last}; the band begins at ${lowest}.`,
    nextStep: addFiner,
  }),
  'below-formal': ({ last, before, lowest, lastOrder, formal, gap, orders }) => ({
    sentence: `The last two pairs show orders ${before} and ${last}, below ${lowest}; their distance from ${formal} goes from ${gap(orders.at(-2))} to ${gap(orders.at(-1))} and ${isClosing(formal, orders) ? 'closes too slowly' : 'does not close'}.`,
    nextStep: lastOrder !== null && lastOrder < standsStill
      ? `The error ${lastOrder < 0 ? 'does not fall' : 'hardly falls'}. Compare source term, boundary values, constants, units and time of the run with the exact solution, and state the iterative error.`
      : lowerOrderPart,
  }),
  'left-band': ({ last, before, lowest }) => ({
    sentence: `The finest pair shows order ${last}, below ${lowest}, after ${before} within the band.`,
    nextStep: 'State the iterative error if iteration stopped early, or add a finer grid to see whether the error stands still.',
  }),
  scatter: (facts) => ({
    sentence: scatterSentence(facts),
    nextStep: 'Check that the grids are refined alike in every direction and that each run is converged; then add a finer grid.',
  }),
  'within-uncertainty': ({ last, band }, { orders }) => ({
    sentence: `The finest pair shows order ${last}${unseen(orders[0]?.uncertainty)}, too uncertain for the band of ${band}.`,
    nextStep: 'Lower the iterative error, or store more digits, so that the known error of the finest grids is smaller.',
  }),
  'sampling-not-stated': ({ claimed, last }, { elements }) => (elements ? explainQuadrature(elements, last) : {
    sentence: `${capitalise(claimed)} is declared${last === '–' ? '' : ` and the finest pair shows ${last}`}, but nobody said where the values live: cell averages differ from point values at second order.`,
    nextStep: 'State in the case whether the values are point values, cell averages or at quadrature points.',
  }),
  'not-similar': ({ last, before, band }, { dissimilar }) => ({
    sentence: `The last two pairs show orders ${before} and ${last} against a band of ${band}, but the grids are not refined alike everywhere${dissimilar ? `: ${describeDissimilar(dissimilar)}` : ''}.`,
    nextStep: 'Refine every direction and region by the same ratio and run the grids again.',
  }),
  'no-target': ({ name, last }) => ({
    sentence: `No formal order is declared for ${name}, so it is not judged${last === '–' ? '' : `; the finest pair shows order ${last}`}.`,
    nextStep: 'Declare a formal order to have it judged.',
  }),
};

function largest(grids: readonly FieldGrid[]): FieldGrid | undefined {
  return grids.reduce<FieldGrid | undefined>((most, grid) => (most && most.error >= grid.error ? most : grid), undefined);
}

/** Whether the last two orders come nearer to the formal one, if not by enough. */
function isClosing(formal: string, orders: readonly number[]): boolean {
  const [before, last] = orders.slice(-2).map((order) => Math.abs(Number(formal) - order));
  return before !== undefined && last !== undefined && last < before;
}

/** An uncertainty too small to stand beside the order, but large enough to leave the question open. */
function unseen(uncertainty: number | null | undefined): string {
  return uncertainty && uncertainty < shownUncertainty ? ` ± ${formatValue(uncertainty, uncertainty)}` : '';
}

function printLimit(orders: readonly number[]): string {
  const [x, y, z] = orders.slice(-3);
  const limit = x === undefined || y === undefined || z === undefined ? null : aitkenLimit(x, y, z);
  return limit === null ? '–' : formatOrder(limit);
}

function scatterSentence({ name, last, before, band, used }: FieldFacts): string {
  const zero = used.find((grid) => grid.error === 0);
  if (zero) return `On grid ${zero.label} ${name} is 0, while it is not on a finer grid.`;
  return `The orders scatter: ${before}, then ${last}, against a band of ${band}.`;
}
