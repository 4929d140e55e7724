import type { FieldAssessment, FieldGrid } from '@/lib/numerics/assessment';
import { formatError } from '../numbers/format-error';
import { formatOrder } from '../numbers/format-order';
import { capitalise, nameErrors } from './series-name';

/** The figures of a field and norm as its sentences quote them. */
export interface FieldFacts {
  /** "the L2 error of u", and with a capital. */
  name: string;
  Name: string;
  formal: string;
  /** "1.90 to 2.20". */
  band: string;
  lowest: string;
  highest: string;
  /** Orders of the finest pair, the one before and the one before that, printed; "–" where there is none. */
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
  const print = (order: number | null | undefined) => (order === null || order === undefined ? '–' : formatOrder(order, limits));
  const printLimit = (index: number) => (limits[index] === undefined ? '–' : formatOrder(limits[index]));
  const name = nameErrors(field);
  return {
    name, Name: capitalise(name),
    formal: judgedBy === null ? '–' : String(judgedBy),
    band: `${printLimit(0)} to ${printLimit(1)}`, lowest: printLimit(0), highest: printLimit(1),
    last: print(field.orders[0]?.order), before: print(field.orders[1]?.order), lastOrder: field.orders[0]?.order ?? null,
    orders: field.orders.flatMap((pair) => pair.order ?? []).reverse(),
    gap: (order) => (order === null || order === undefined || judgedBy === null ? '–' : Math.abs(judgedBy - order).toFixed(3)),
    used: field.grids.filter((grid) => grid.used), unused: field.grids.filter((grid) => !grid.used),
    errorOf: (grid) => (grid ? formatError(grid.error).text : '–'),
  };
}
