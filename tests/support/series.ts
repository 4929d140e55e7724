import type { ErrorSeries, QuantitySeries } from '@/lib/numerics/assessment';

/** An error series of a second-order L2 norm from spacings and errors in any order, changed as asked. */
export function errorSeries(h: readonly number[], errors: readonly number[], changes: Partial<ErrorSeries> & { knownErrors?: readonly number[] } = {}): ErrorSeries {
  const { knownErrors, ...rest } = changes;
  const grids = h.map((spacing, i) => ({
    label: `g${i + 1}`, h: spacing, error: errors[i] ?? Number.NaN, knownError: knownErrors?.[i] ?? 0, exactNorm: null, at: null,
  }));
  return {
    field: 'u', norm: 'L2', grids: grids.sort((left, right) => left.h - right.h), formalOrder: 2, derivedOrder: null, tolerance: null, counts: true,
    expectExact: false, exactLimit: null, scale: null, precision: 'double', minimumGrids: 4, samplingStated: true, ...rest,
  };
}

/** A quantity from spacings and values, the finest first, changed as asked. */
export function quantitySeries(h: readonly number[], values: readonly number[], changes: Partial<QuantitySeries> = {}): QuantitySeries {
  return {
    name: 'drag', unit: null, formalOrder: null, target: null, minimumGrids: 3, procedure: 'three-grid', uNumFactor: null,
    grids: h.map((spacing, i) => ({ label: `g${i + 1}`, h: spacing, value: values[i] ?? Number.NaN, resolution: null })), ...changes,
  };
}
