import type { ErrorSeries, QuantitySeries } from '../assessment';
import { halfUnits } from '../order/half-units';

/**
 * A quantity whose exact value is known, as the series of its errors |φ − known| under its own name, norm `value`: it is
 * judged as a field is, not by GCI. The known error of each is half a unit of its last digit plus the iterative and
 * time errors stated for it, in the quantity's unit; the scale is |known|. Counts unless changed by the
 * caller, who also puts a declared tolerance, derived order or exactness in.
 */
export function errorSeriesOfQuantity(quantity: QuantitySeries, known: number): ErrorSeries {
  if (!Number.isFinite(known)) throw new RangeError(`known value of ${quantity.name} must be finite, got ${known}`);
  const halves = halfUnits(quantity.grids);
  return {
    field: quantity.name, norm: 'value',
    grids: quantity.grids.map(({ label, h, value, iterativeError = 0, timeError = 0 }, index) => ({
      label, h, error: Math.abs(value - known), knownError: (halves[index] ?? 0) + iterativeError + timeError,
      exactNorm: Math.abs(known), at: null,
    })),
    formalOrder: quantity.formalOrder, derivedOrder: null, tolerance: null, counts: true, expectExact: false, exactLimit: null,
    scale: Math.abs(known), precision: 'double', minimumGrids: quantity.minimumGrids, samplingStated: true,
  };
}
