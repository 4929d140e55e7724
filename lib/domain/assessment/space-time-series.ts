import type { Norm, SpaceTimeSeries } from '@/lib/numerics/assessment';
import { gridSpacing } from '@/lib/numerics/spacing/grid-spacing';
import { withElementOrders } from '../cases/element-orders';
import { statedSpacing } from '../studies/stated-spacing';
import { gridError, quantitySeries } from './study-series';
import type { PlacedGrid, StudySeries, StudyToAssess } from './study-to-assess';

type PlacedInTime = PlacedGrid & { dt: number };

/** Errors of every field and norm, and of every quantity with a known value, over a matrix of grids and time steps. */
export function spaceTimeSeries({ definition, grids, dimension, volume }: Omit<StudyToAssess, 'refinement'>): StudySeries {
  const placed: PlacedInTime[] = [];
  const faults: string[] = [];
  for (const { grid, norms } of grids) {
    const spacing = gridSpacing(withoutNulls(statedSpacing(grid, norms)), { refinement: 'space', dimension, volume });
    if ('code' in spacing) faults.push(`Grid ${grid.label}: ${spacing.found}; expected ${spacing.expected}.`);
    else if (grid.dt === undefined) faults.push(`Grid ${grid.label}: no time step; expected one.`);
    else placed.push({ grid, norms, h: spacing.h, dt: grid.dt });
  }
  if (faults.length > 0) return { ok: false, reason: faults.join(' ') };
  const declared = withElementOrders(definition);
  const fields = declared.fields.flatMap(({ field, norms }) => norms.map(({ norm, formalOrder }) => (
    { field, norm, isSigned: false, formalOrder: formalOrder ?? null, points: errorPoints(placed, field, norm) }
  )));
  const values = declared.quantities.flatMap((quantity): SpaceTimeSeries[] => {
    const { name, knownValue, formalOrder } = quantity;
    return knownValue === undefined ? [] : [{
      field: name, norm: 'value', isSigned: true, formalOrder: formalOrder ?? null,
      points: placed.flatMap((one) => quantitySeries(quantity, [one], 0).grids.map(({ label, h, value }) => ({ label, h, dt: one.dt, error: value - knownValue }))),
    }];
  });
  return { ok: true, errors: [], quantities: [], spaceTime: [...fields, ...values] };
}

function errorPoints(placed: readonly PlacedInTime[], field: string, norm: Norm): SpaceTimeSeries['points'] {
  return placed.flatMap((one) => {
    const found = gridError(one, field, { norm, significantDigits: null });
    return found ? [{ label: found.label, h: found.h, dt: one.dt, error: found.error }] : [];
  });
}

function withoutNulls({ label, h, cells, cellsPerDirection, weightSum, rows }: ReturnType<typeof statedSpacing>) {
  return { label, h: h ?? undefined, cells: cells ?? undefined, cellsPerDirection: cellsPerDirection ?? undefined, weightSum: weightSum ?? undefined, rows: rows ?? undefined };
}
