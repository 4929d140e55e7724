import { norms, type ErrorSeries, type Norm, type QuantitySeries } from '@/lib/numerics/assessment';
import { errorSeriesOfQuantity } from '@/lib/numerics/outcome/error-series-of-quantity';
import { builtInRule } from '../rules/built-in-rule';
import type { QuickCheckGrid } from './quick-check-grids';
import type { QuickCheckInput } from './quick-schema';

export const quickCheckNorms = norms;

function perNorm(stated: QuickCheckInput['formalOrder'], norm: Norm): number | null {
  if (stated === undefined || typeof stated === 'number') return stated ?? null;
  return stated[norm] ?? null;
}

/** One series for every norm that the grids have. */
export function quickCheckErrors(input: QuickCheckInput, grids: readonly QuickCheckGrid[], field: string): ErrorSeries[] {
  const stated = quickCheckNorms.filter((norm) => grids.some((grid) => grid.errors?.[norm] !== undefined));
  return stated.map((norm) => ({
    field, norm,
    grids: grids.flatMap(({ label, h, errors, iterativeError }) => {
      const error = errors?.[norm];
      return error === undefined ? [] : [{ label, h, error, knownError: iterativeError?.[norm] ?? 0, exactNorm: null, at: null }];
    }),
    formalOrder: perNorm(input.formalOrder, norm), derivedOrder: input.derivedOrder ?? null, tolerance: perNorm(input.tolerance, norm),
    counts: true, expectExact: input.expectExact ?? false, exactLimit: input.exactLimit ?? null, scale: input.reference ?? null,
    precision: 'double', minimumGrids: input.minimumGrids ?? builtInRule.minimumGrids,
    // Norms computed in the solver: where its values live was decided there.
    samplingStated: true,
  }));
}

export function quickCheckQuantity(input: QuickCheckInput, grids: readonly QuickCheckGrid[], name: string): QuantitySeries {
  return {
    name, unit: null,
    grids: grids.flatMap(({ label, h, value, resolution }) => (value === undefined ? [] : [{ label, h, value, resolution: resolution ?? null }])),
    formalOrder: typeof input.formalOrder === 'number' ? input.formalOrder : null, target: input.target ?? null,
    procedure: input.procedure ?? 'three-grid', uNumFactor: input.uNumFactor ?? null,
    minimumGrids: input.minimumGrids ?? builtInRule.minimumGridsOfQuantity,
  };
}

/** A quantity with a known value is judged by its error. */
export function quickCheckKnown(input: QuickCheckInput, grids: readonly QuickCheckGrid[], name: string, known: number): ErrorSeries {
  const series = errorSeriesOfQuantity(quickCheckQuantity(input, grids, name), known);
  return {
    ...series,
    derivedOrder: input.derivedOrder ?? null, tolerance: typeof input.tolerance === 'number' ? input.tolerance : null,
    expectExact: input.expectExact ?? false, exactLimit: input.exactLimit ?? null,
    scale: Math.max(Math.abs(known), input.reference ?? 0), minimumGrids: input.minimumGrids ?? builtInRule.minimumGrids,
  };
}
