import type { FieldAssessment } from '@/lib/numerics/assessment';
import { formatRatio } from '../numbers/format-ratio';
import { orderWord } from '../numbers/order-word';
import { nameErrors } from './series-name';

export type Refinement = 'space' | 'time';

const spacingWords = { space: 'the spacing', time: 'the time step' } as const;
/** Closer to 2 than the two decimals of a printed ratio can tell. */
const halving = 0.005;

/**
 * What the last refinement did to the error, beside what the formal order promises: "Halving the spacing divides the L2
 * error of u by 3.97; second order would divide it by 4". Another ratio than 2 is stated as it was. Null without a pair.
 */
export function stateRatio(field: FieldAssessment, refinement: Refinement): string | null {
  const pair = field.orders[0];
  const errorOn = (label: string | undefined) => field.grids.find((grid) => grid.label === label)?.error;
  const [coarse, fine] = [errorOn(pair?.coarse), errorOn(pair?.fine)];
  if (!pair || !coarse || !fine) return null;
  const isHalving = Math.abs(pair.ratio - 2) <= halving;
  const refining = isHalving ? `Halving ${spacingWords[refinement]}` : `Refining ${spacingWords[refinement]} by a ratio of ${formatRatio(pair.ratio)}`;
  const change = coarse / fine;
  const verb = change >= 0.995 ? 'divides' : 'multiplies';
  const seen = `${refining} ${verb} ${nameErrors(field)} by ${formatRatio(change >= 0.995 ? change : 1 / change)}`;
  const declared = field.derivedOrder ?? field.formalOrder;
  return declared === null ? `${seen}.` : `${seen}; ${orderWord(declared)} would divide it by ${promised(expectedRatio(field, declared))}.`;
}

/** What the order makes of an error over the finest pair; of differences r21^p·(r32^p − 1)/(r21^p − 1). */
function expectedRatio({ orders, grids, comparedTo }: FieldAssessment, order: number): number {
  const fine = orders[0]?.ratio ?? 1;
  const middle = grids.findIndex(({ label }) => label === orders[0]?.coarse);
  const [h2, h3] = [grids[middle]?.h, grids[middle + 1]?.h ?? comparedTo?.h];
  if (comparedTo === undefined || h2 === undefined || h3 === undefined) return fine ** order;
  return fine ** order * ((h3 / h2) ** order - 1) / (fine ** order - 1);
}

function promised(ratio: number): string {
  const whole = Math.round(ratio);
  return Math.abs(ratio - whole) < 1e-3 ? String(whole) : formatRatio(ratio);
}
