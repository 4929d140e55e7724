import type { JudgedField } from './judged-fields';

/** Spacings computed from counts differ in their last digits. */
const sameWithin = 1e-9;

/** The error of a field on the grid of spacing h, null where it has none. */
export function errorAt(field: JudgedField, h: number): number | null {
  return field.grids.find((grid) => Math.abs(grid.h - h) <= sameWithin * h)?.error ?? null;
}

/** The finest spacing that all series have, null where there is none. */
export function finestSharedSpacing(fields: readonly JudgedField[]): number | null {
  const [first, ...others] = fields;
  const shared = (first?.grids ?? []).map((grid) => grid.h).filter((h) => others.every((field) => errorAt(field, h) !== null));
  return shared.length === 0 ? null : Math.min(...shared);
}
