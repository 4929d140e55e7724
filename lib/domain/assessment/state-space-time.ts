import type { SpaceTimeAssessment } from '@/lib/numerics/assessment';
import { formatMeasure } from '../numbers/format-measure';
import { formatOrder } from '../numbers/format-order';
import { nameErrors } from './series-name';

/** What a fit in space and time found, in a sentence with its numbers. */
export function stateSpaceTime(parts: readonly SpaceTimeAssessment[]): string {
  const fitted = parts.find(({ p }) => p !== null);
  if (fitted?.p === null || fitted?.q === null || !fitted) return 'The grids and time steps do not suffice for a fit in space and time.';
  const last = fitted.points[0];
  const larger = !last || last.space === null || last.time === null ? '' : Math.abs(last.space) >= Math.abs(last.time)
    ? '; on the finest grid with the smallest step the spacing has the larger part' : '; on the finest grid with the smallest step the time step has the larger part';
  const order = (value: number, spread: number | undefined) => `${formatOrder(value)}${spread === undefined ? '' : ` ± ${formatMeasure(spread)}`}`;
  return `Fitted over all grids and time steps, ${nameErrors(fitted)} falls with order ${order(fitted.p, fitted.spread?.p)} in space and order ${order(fitted.q, fitted.spread?.q)} in time${larger}.`;
}

export const spaceTimeNextStep = 'A fit shows orders and has no outcome. To have an order judged, refine along one family with the time step bound to the spacing.';
