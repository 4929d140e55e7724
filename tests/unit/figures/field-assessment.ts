import type { FieldAssessment, SeriesNorm } from '@/lib/numerics/assessment';

interface Given { field?: string; norm?: SeriesNorm; errors: number[]; cells?: number[]; formal?: number | null; tolerance?: number | null; unused?: number[] }

/** An assessment as a figure meets it: grids finest first, the finest labelled "1", errors in that order. */
export function fieldAssessment({ field = 'u', norm = 'L2', errors, cells = [64, 32, 16, 8], formal = 2, tolerance = 0.1, unused = [] }: Given): FieldAssessment {
  const grids = errors.map((error, index) => ({
    label: String(index + 1), h: 1 / (cells[index] ?? 1), error, relativeError: null, knownError: 0, used: !unused.includes(index),
  }));
  const orders = grids.slice(1).flatMap((coarse, index) => {
    const fine = grids[index];
    if (!fine) return [];
    const ratio = coarse.h / fine.h;
    const order = fine.error > 0 && coarse.error > 0 ? Math.log(coarse.error / fine.error) / Math.log(ratio) : null;
    return [{ coarse: coarse.label, fine: fine.label, ratio, order, uncertainty: null }];
  });
  return {
    field, norm, region: 'all', formalOrder: formal, derivedOrder: null, tolerance, counts: true,
    grids, orders, fit: null, outcome: 'pass', reasons: [],
  };
}
