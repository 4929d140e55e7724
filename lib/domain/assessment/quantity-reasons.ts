import type { QuantityAssessment, ReasonCode } from '@/lib/numerics/assessment';
import { spansRatio } from '@/lib/numerics/spacing/spans-ratio';
import { formatMeasure } from '../numbers/format-measure';
import { formatOrder } from '../numbers/format-order';
import { formatPercent } from '../numbers/format-percent';
import { formatRatio } from '../numbers/format-ratio';
import { describeDissimilar } from './describe-similarity';
import type { Explanation } from './explanation';
import { gciWithFormalOrder } from './gci-with-formal-order';
import { estimatedBand, printBand } from './estimated-band';
import { joinWords } from './series-name';

type QuantityText = (quantity: QuantityAssessment) => Explanation;

const behaviour = {
  monotone: 'converge monotonically', oscillatory: 'oscillate, with a shrinking step', divergent: 'diverge',
  'oscillatory-divergent': 'oscillate, with a growing step', unchanged: 'differ by no more than their printed digits',
} as const;

export const quantityReasons: Partial<Record<ReasonCode, QuantityText>> = {
  'within-target': (quantity) => ({
    sentence: `The ${estimatedBand(quantity).name} of the finest grid is ${percent(estimatedBand(quantity).fraction)}, within the target of ${percent(quantity.target)}; ${ordersSeen(quantity)}.${caution(quantity)}`,
    nextStep: quantity.triples.length > 1 ? 'Nothing more is needed.' : 'Nothing more is needed; a fourth grid would confirm the order.',
  }),
  'above-target': (quantity) => ({
    sentence: `The ${estimatedBand(quantity).name} of the finest grid is ${percent(estimatedBand(quantity).fraction)}, above the target of ${percent(quantity.target)}; ${ordersSeen(quantity)}.${caution(quantity)}`,
    nextStep: 'Add a finer grid, or state the target the value is really needed to.',
  }),
  'not-monotone': (quantity) => {
    const triple = quantity.triples.find(({ convergence }) => convergence !== 'monotone');
    return {
      sentence: `On grids ${joinWords(triple?.grids ?? [])} the values ${behaviour[triple?.convergence ?? 'unchanged']}${rangeSeen(quantity)}.`,
      nextStep: triple?.convergence === 'unchanged'
        ? 'Give the values with more digits, or take grids further apart.'
        : 'Check iteration and similarity of the grids, then add a finer one.',
    };
  },
  'order-off-formal': (quantity) => ({
    sentence: `${ordersSeen(quantity).replace(/^t/, 'T')}, where formal order ${quantity.formalOrder ?? '–'} is declared${gciSeen(quantity)}.`,
    nextStep: 'Add a finer grid, or check the declared order for this quantity: singular points and limiters lower it.',
  }),
  'order-not-observed': (quantity) => ({
    sentence: `Two grids show no order: a GCI of ${printBand(quantity)} assumes formal order ${quantity.formalOrder ?? '–'} and takes a safety factor of ${quantity.safetyFactor ?? '–'}.`,
    nextStep: 'Add a third grid, finer by a ratio of 1.3 or more.',
  }),
  'order-out-of-range': (quantity) => ({
    sentence: `The values of grids ${joinWords(quantity.triples.find(isOutOfRange)?.grids ?? [])} fit no order between −10 and 20.`,
    nextStep: 'Check the values and spacings for a slip, then add a grid.',
  }),
  'too-few-grids': (quantity) => {
    const spacings = quantity.values.map(({ h }) => h);
    const span = (spacings.at(-1) ?? 1) / (spacings[0] ?? 1);
    if (quantity.values.length === 0) return { sentence: `No grid has a value of ${quantity.name}.`, nextStep: 'State the value on at least 3 grids, each at a ratio of 1.3 or more to the next.' };
    const counted = quantity.values.length === 1 ? 'There is 1 grid' : `There are ${quantity.values.length} grids, spanning a ratio of ${formatRatio(span)}`;
    return {
      sentence: `${counted}; ${spansRatio(spacings) ? 'more are asked for, each at a ratio of 1.3 or more to the next' : 'a ratio of 2 is needed, in steps of 1.3 or more'}.`,
      nextStep: 'Add a grid, finer than the finest by a ratio of 1.3 or more.',
    };
  },
  'not-similar': (quantity) => ({
    sentence: `The ${estimatedBand(quantity).name} of the finest grid is ${percent(estimatedBand(quantity).fraction)}, within the target of ${percent(quantity.target)}, but the grids are not refined alike everywhere: ${describeDissimilar(quantity.dissimilar ?? [])}.`,
    nextStep: 'Refine every direction and region by the same ratio and run the grids again.',
  }),
  'no-target': (quantity) => explainNoTarget(quantity),
};

function explainNoTarget(quantity: QuantityAssessment): Explanation {
  const { name, formalOrder, target, unit, orderObserved } = quantity;
  if (formalOrder !== null && target !== null) {
    const { name: band, absolute } = estimatedBand(quantity);
    if (absolute === null) {
      return {
        sentence: `The procedure gives no uncertainty of ${name} on these grids.`,
        nextStep: 'Add grids, four for a fit by least squares, or choose another procedure in the case.',
      };
    }
    return {
      sentence: `The value of ${name} is smaller than ten times its last change, so ${band} in percent of it says nothing; in the quantity's unit it is ${formatMeasure(absolute, unit)}.`,
      nextStep: 'Judge the uncertainty in the unit of the quantity, or take a quantity that is not near zero.',
    };
  }
  const missing = [...(formalOrder === null ? ['formal order'] : []), ...(target === null ? ['target'] : [])];
  return {
    sentence: `No ${missing.join(' and no ')} is declared for ${name}, so it is not judged${orderObserved === null ? '' : `; order ${formatOrder(orderObserved)} is observed`}.`,
    nextStep: `Declare a ${missing.join(' and a ')} to have it judged.`,
  };
}

function percent(fraction: number | null): string {
  return fraction === null ? '–' : formatPercent(fraction);
}

function ordersSeen({ triples }: QuantityAssessment): string {
  const orders = triples.slice(0, 2).map(({ order }) => (order === null ? '–' : formatOrder(order)));
  return orders.length > 1 ? `the last two triples show orders ${joinWords(orders)}` : `the three grids show order ${orders.join('')}`;
}

function gciSeen(quantity: QuantityAssessment): string {
  const { name, absolute } = estimatedBand(quantity);
  return absolute === null ? '' : `: the ${name} of ${printBand(quantity)} is not held against the target`;
}

function isOutOfRange({ order, convergence }: QuantityAssessment['triples'][number]): boolean {
  return order === null && (convergence === 'monotone' || convergence === 'divergent');
}

function rangeSeen({ halfRange, unit }: QuantityAssessment): string {
  return halfRange === null ? '' : `; half the range of the finest three is ${formatMeasure(halfRange, unit)}`;
}

function caution(quantity: QuantityAssessment): string {
  const withFormal = gciWithFormalOrder(quantity);
  return withFormal === null || formatPercent(withFormal) === percent(quantity.gci) ? '' : ` An order above the formal one shrinks the GCI: with order ${quantity.formalOrder ?? '–'} it would be ${formatPercent(withFormal)}.`;
}
