import type { GridNorms, SolutionNorms } from '@/lib/numerics/norms/grid-norms';
import type { GridReading } from '@/lib/readers/grid-reading';

/** Fields without an exact solution are read as they are, compared with nothing; their gradients are not. */
export function planSolutions(reading: GridReading, solutions: readonly string[]): GridReading {
  if (solutions.length === 0) return reading;
  return {
    ...reading,
    fields: reading.fields.flatMap((each) => {
      if (solutions.includes(each.field)) return [{ field: each.field, compare: '0' }];
      return solutions.some((field) => each.field.startsWith(`d(${field}, `)) ? [] : [each];
    }),
  };
}

/** Parts the norms of solutions, which are no errors, from those of errors. */
export function keepSolutions(norms: GridNorms, names: readonly string[]): GridNorms {
  if (names.length === 0) return norms;
  const solutions = norms.fields.filter(({ field }) => names.includes(field)).map(({ field, L1, L2, Linf, min, max, maxAbs, count, significantDigits }): SolutionNorms => (
    { field, L1, L2, Linf, min, max, maxAbs, count, significantDigits }
  ));
  return { ...norms, fields: norms.fields.filter(({ field }) => !names.includes(field)), solutions };
}
