import type { Pattern, PatternCode } from '@/lib/numerics/assessment';
import { formatOrder } from '../numbers/format-order';

const unknown = '–';

type PatternText = (of: string, evidence: (name: string) => string) => string;

/** What each pattern may mean; a hint that wants checking. */
const texts: Record<PatternCode, PatternText> = {
  'one-field-flat': (of, show) => `The error of ${of} hardly falls (order ${show('order')}) while the other fields show ${show('lowestOther')} or more: look at its source term, boundary value or constant.`,
  'all-flat': (_, show) => `No error falls (order ${show('highestOrder')} at most): look at the exact solution, time or units, or a scheme that is not consistent.`,
  datum: (of, show) => `Without its mean the error of ${of} falls with order ${show('orderWithoutMean')}: the field may be right up to a constant. Declare its datum as mean.`,
  'boundary-closure': (of, show) => (show('boundaryOrder') !== unknown
    ? `The error of ${of} falls with order ${show('boundaryOrder')} along the boundary and ${show('interiorOrder')} inside, and is the larger along the boundary: look at the boundary closure or condition.`
    : `L1, L2 and L∞ of ${of} fall with orders ${show('L1')}, ${show('L2')} and ${show('Linf')}, and the largest error lies at the boundary: look at the boundary closure or condition.`),
  shock: (of, show) => `L1, L2 and L∞ of ${of} fall with orders ${show('L1')}, ${show('L2')} and ${show('Linf')}, as across a shock.`,
  contact: (of, show) => `L1, L2 and L∞ of ${of} fall with orders ${show('L1')}, ${show('L2')} and ${show('Linf')}, as across a contact.`,
  limiter: (of, show) => `L2 and L∞ of ${of} fall with orders ${show('L2')} and ${show('Linf')}, as where a limiter clips smooth extrema.`,
  'first-order': (of) => `Every norm of ${of} is about first order: a first-order term may be active, or a correction for non-orthogonality left out.`,
  'falling-order': (of, show) => `The orders of ${of} fall under refinement, from ${show('first')} to ${show('last')}: a floor of iteration, storage, or the time step (or spacing) that is held.`,
  'stuck-at-two': (of) => `Every norm of ${of} is about second order: look at how values are sampled, primitive variables formed from averages, interpolated output, or straight edges on a curved wall.`,
  corner: (of, show) => `L2 of ${of} falls with twice the order of H1 (${show('L2')}, ${show('H1')}), as at a corner: state a regularity of about ${show('regularity')}, or take a smoother solution.`,
  alternating: (of, show) => `The orders of ${of} alternate (${show('before')}, ${show('between')}, ${show('last')}): the grids may not be similar.`,
};

/** A hint in a sentence. */
export function explainPattern({ code, field, evidence }: Pattern): string {
  return texts[code](field ?? 'the fields', (name) => (evidence[name] === undefined ? unknown : formatOrder(evidence[name])));
}
