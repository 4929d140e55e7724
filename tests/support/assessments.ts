import type { Assessment } from '@/lib/domain/assessment/schema';
import { assessSeries } from '@/lib/numerics/assess-series';
import type { ErrorSeries, QuantitySeries } from '@/lib/numerics/assessment';

/** An assessment of series, as it would be kept. */
export function assessmentOf(errors: ErrorSeries[], quantities: QuantitySeries[] = []): Assessment {
  return { ...assessSeries({ errors, quantities }), patterns: [], inputs: [], inputsSha256: '0'.repeat(64) };
}
