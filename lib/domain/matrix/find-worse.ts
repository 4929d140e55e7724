import { defaultTolerance } from '@/lib/numerics/outcome/default-tolerance';
import type { Assessment } from '../assessment/schema';
import { judgedFields, judgedOrder, lastOrder, type JudgedField } from './judged-fields';
import type { Matrix } from './schema';
import { errorAt, finestSharedSpacing } from './shared-spacing';

type Worse = Matrix['worse'][number];
interface Assessed { release: string; assessment: Assessment }

/** Two runs of one solver on one grid differ by less, whatever the machine and compiler. */
const errorGrowth = 1.05;

/**
 * What got worse in a case between two releases: of each counting field the norm that lost most. Worse is an error at
 * the finest shared spacing grown by more than 5 %, or an order fallen by more than half the tolerance of its norm and
 * what its known errors allow. Errors at round-off are not compared.
 */
export function findWorse(row: { slug: string; name: string }, before: Assessed, after: Assessed): Worse[] {
  const worst = new Map<string, Worse>();
  for (const now of judgedFields(after.assessment)) {
    const then = judgedFields(before.assessment).find((field) => field.field === now.field && field.norm === now.norm);
    const found = then && compare(then, now);
    if (!found) continue;
    const entry = { case: row.slug, caseName: row.name, field: now.field, norm: now.norm, before: before.release, after: after.release, ...found };
    const present = worst.get(now.field);
    if (!present || entry.ratio > present.ratio) worst.set(now.field, entry);
  }
  return [...worst.values()];
}

type Comparison = Pick<Worse, 'h' | 'orderBefore' | 'orderAfter' | 'errorBefore' | 'errorAfter' | 'ratio'>;

function compare(then: JudgedField, now: JudgedField): Comparison | null {
  if (now.reasons.includes('exact')) return null;
  const h = finestSharedSpacing([then, now]);
  if (h === null) return null;
  const [errorBefore, errorAfter] = [errorAt(then, h), errorAt(now, h)];
  if (errorBefore === null || errorAfter === null || errorBefore === 0) return null;
  const ratio = errorAfter / errorBefore;
  const [orderBefore, orderAfter] = [lastOrder(then), lastOrder(now)];
  if (ratio <= errorGrowth && !hasFallen(then, now)) return null;
  return { h, orderBefore, orderAfter, errorBefore, errorAfter, ratio };
}

function hasFallen(then: JudgedField, now: JudgedField): boolean {
  const [orderBefore, orderAfter, formal] = [lastOrder(then), lastOrder(now), judgedOrder(now)];
  if (orderBefore === null || orderAfter === null || formal === null) return false;
  const uncertainty = (then.orders[0]?.uncertainty ?? 0) + (now.orders[0]?.uncertainty ?? 0);
  return orderBefore - orderAfter > (now.tolerance ?? defaultTolerance(now.norm, formal)) / 2 + uncertainty;
}
