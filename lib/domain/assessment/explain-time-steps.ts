import { timeStepFamily } from '@/lib/numerics/spacing/time-step-family';
import { formatOrder } from '../numbers/format-order';

interface Placed { h: number; dt: number }

/** What the time steps of a series refined in space do to its orders; null where that is nothing, or none are stated. */
export function explainTimeSteps(grids: readonly Placed[]): string | null {
  const family = grids.length > 1 ? timeStepFamily(grids) : null;
  if (family === null) return null;
  switch (family.kind) {
    case 'fixed': return 'The time step is the same on every grid: its error stays while the spacing’s falls, and then looks like a stall.';
    case 'power': {
      const s = Number(formatOrder(family.exponent));
      return `The time step falls with the spacing to the power ${s}: an order q in time shows as ${s === 1 ? 'q' : `${s} q`}, and the formal order is the smaller of that and the order in space.`;
    }
    case 'free': return 'The time steps follow no power of the spacing: orders then mix space and time.';
  }
}
