import type { Assessment } from '../assessment/schema';

export type JudgedField = Assessment['fields'][number];

/** Fields and norms that count towards the outcome. */
export function judgedFields(assessment: Assessment): JudgedField[] {
  return assessment.fields.filter((field) => field.counts && field.outcome !== null);
}

/** The order of the finest pair, null where it could not be read. */
export function lastOrder(field: JudgedField): number | null {
  return field.orders[0]?.order ?? null;
}

/** The order a field is judged by: a derived one replaces the formal one. */
export function judgedOrder(field: JudgedField): number | null {
  return field.derivedOrder ?? field.formalOrder;
}
