import type { FieldAssessment, FieldGrid, PairOrder } from '@/lib/numerics/assessment';
import { formatError } from '../numbers/format-error';
import { formatOrder } from '../numbers/format-order';
import { formatValue } from '../numbers/format-value';
import { capitalise, nameErrors } from './series-name';

/** The figures of a field and norm as its sentences quote them. */
export interface FieldFacts {
  /** "the L2 error of u", and with a capital. */
  name: string;
  Name: string;
  formal: string;
  /** "formal order 2", or "derived order 3" where that replaces it. */
  claimed: string;
  /** "1.90 to 2.20". */
  band: string;
  lowest: string;
  highest: string;
  /** Orders of the finest pair and the one before, printed with ± what the known errors allow where that shows; "–" where there is none. */
  last: string;
  before: string;
  lastOrder: number | null;
  /** Observed orders, coarse to fine. */
  orders: number[];
  /** Distance of an order from the formal one, printed. */
  gap: (order: number | null | undefined) => string;
  used: FieldGrid[];
  unused: FieldGrid[];
  errorOf: (grid: FieldGrid | undefined) => string;
}

export function gatherFieldFacts(field: FieldAssessment): FieldFacts {
  const judgedBy = field.derivedOrder ?? field.formalOrder;
  const tolerance = field.tolerance ?? 0;
  const limits = judgedBy === null ? [] : [judgedBy - tolerance, judgedBy + 2 * tolerance];
  const print = (pair: PairOrder | undefined) => (pair ? printOrder(pair, limits) : '–');
  const printLimit = (index: number) => (limits[index] === undefined ? '–' : formatOrder(limits[index]));
  const name = nameErrors(field);
  return {
    name, Name: capitalise(name),
    formal: judgedBy === null ? '–' : String(Number(judgedBy.toPrecision(4))),
    claimed: `${field.derivedOrder === null ? 'formal' : 'derived'} order ${judgedBy === null ? '–' : Number(judgedBy.toPrecision(4))}`,
    band: `${printLimit(0)} to ${printLimit(1)}`, lowest: printLimit(0), highest: printLimit(1),
    last: print(field.orders[0]), before: print(field.orders[1]), lastOrder: field.orders[0]?.order ?? null,
    orders: field.orders.flatMap((pair) => pair.order ?? []).reverse(),
    gap: (order) => (order === null || order === undefined || judgedBy === null ? '–' : Math.abs(judgedBy - order).toFixed(3)),
    used: field.grids.filter((grid) => grid.used), unused: field.grids.filter((grid) => !grid.used),
    errorOf: (grid) => (grid ? formatError(grid.error).text : '–'),
  };
}

/** Below this an uncertainty does not show in two decimals. */
export const shownUncertainty = 0.005;

function printOrder({ order, uncertainty }: PairOrder, limits: readonly number[]): string {
  if (order === null) return '–';
  const printed = formatOrder(order, limits);
  return uncertainty !== null && uncertainty >= shownUncertainty ? `${printed} ± ${formatValue(uncertainty, uncertainty)}` : printed;
}
