import type { FieldAssessment, SeriesNorm } from '../assessment';

/** What a field shows over all its norms: the last order of each, null where there is none. */
export interface FieldOrders {
  field: string;
  formalOrder: number | null;
  last: Partial<Record<SeriesNorm, number>>;
  parts: readonly FieldAssessment[];
  /** Whether some norm was judged and did not pass. */
  isOff: boolean;
}

/** The norms of the whole domain gathered by field; a value with a known one is no field. */
export function fieldOrders(assessments: readonly FieldAssessment[]): FieldOrders[] {
  const whole = assessments.filter(({ region, norm }) => region === 'all' && norm !== 'value');
  return [...new Set(whole.map(({ field }) => field))].map((field) => {
    const parts = whole.filter((part) => part.field === field);
    return {
      field, parts,
      formalOrder: parts.reduce<number | null>((highest, part) => Math.max(highest ?? 0, part.derivedOrder ?? part.formalOrder ?? 0) || highest, null),
      last: Object.fromEntries(parts.flatMap(({ norm, orders }) => (typeof orders[0]?.order === 'number' ? [[norm, orders[0].order]] : []))),
      isOff: parts.some(({ outcome }) => outcome !== null && outcome !== 'pass'),
    };
  });
}
