import type { CaseDefinition, DeclaredField } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { splitColumns } from '@/lib/domain/columns/split-columns';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';
import type { FieldNorms, GradientNorms, GridNorms } from '@/lib/numerics/norms/grid-norms';
import { bestScale } from '@/lib/numerics/norms/best-scale';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { GridReading } from '@/lib/readers/grid-reading';

interface Asked { definition: CaseDefinition; problem: ProblemDefinition; mapping: ColumnMapping; t?: number; cellsPerDirection?: number | number[] }
type ReadField = GridReading['fields'][number];

const axes = ['x', 'y', 'z'] as const;
const derivativeName = (field: string, axis: string) => `d(${field}, ${axis})`;
const squareName = (field: string) => `${field} squared`;

/**
 * What is read of a file: every field against what it is compared with, its gradient columns against the derivatives of
 * the exact field, and what the best factor of a field up to a scale is made of.
 */
export function planReading({ definition, problem, mapping, t, cellsPerDirection }: Asked): GridReading {
  const { dimension, exact = {}, constants } = problem;
  const columns: Record<string, string> = {};
  const fields: ReadField[] = [];
  const add = (name: string, column: string, compare?: string) => {
    columns[name] = column;
    fields.push(compare === undefined ? { field: name } : { field: name, compare });
  };
  for (const { field, compare, datum } of definition.fields) {
    const { value, gradient } = splitColumns(mapping.fields[field], dimension);
    if (value !== undefined) add(field, value, compare);
    if (value !== undefined && datum === 'scale') add(squareName(field), value, '0');
    gradient.forEach((column, at) => add(derivativeName(field, axes[at] ?? 'x'), column, derivativeName(field, axes[at] ?? 'x')));
  }
  return { mapping: { ...mapping, fields: columns }, problem: { dimension, exact, constants }, fields, t,
    mesh: { sizes: mapping.weight !== null && definition.sampling !== 'quadrature' },
    ...(definition.sampling === 'average' && { average: { points: averagingPoints(definition), extents: uniformExtents(problem, mapping, cellsPerDirection) } }),
  };
}

/** max(3, ⌈(pf + 3)/2⌉) per direction, so that averaging errs well below the highest order declared. */
function averagingPoints({ fields }: CaseDefinition): number {
  const highest = Math.max(0, ...fields.flatMap(({ norms }) => norms.map(({ formalOrder = 0, derivedOrder = 0 }) => Math.max(formalOrder, derivedOrder))));
  return Math.max(3, Math.ceil((highest + 3) / 2));
}

/** Cells of one size, from the box of the problem and the cells along each direction; null where columns tell the sizes. */
function uniformExtents({ domain = {}, dimension }: ProblemDefinition, mapping: ColumnMapping, counts: number | number[] | undefined): number[] | null {
  const columns = [mapping.dx, mapping.dy, mapping.dz].slice(0, dimension);
  if (columns.every((column) => column !== undefined)) return null;
  const sizes = axes.slice(0, dimension).flatMap((axis, at) => {
    const [side, count] = [domain[axis], Array.isArray(counts) ? counts[at] : counts];
    return side === undefined || count === undefined ? [] : [(side[1] - side[0]) / count];
  });
  if (sizes.length === dimension) return sizes;
  throw new RejectedFile([{
    code: 'column-missing', count: dimension, line: null, column: null,
    found: 'neither sizes of cells nor, with the box of the problem, cells per direction of the grid', expected: ['dx', 'dy', 'dz'].slice(0, dimension).join(', '),
  }]);
}

/** What the first reading found to be free in each field: the constant or the factor that fits best. */
export function findDatums(definition: CaseDefinition, norms: GridNorms): Map<string, number> {
  const found = new Map<string, number>();
  for (const { field, datum } of definition.fields) {
    const [own, square] = [field, squareName(field)].map((name) => norms.fields.find((each) => each.field === name));
    if (own && datum === 'mean') found.set(field, own.mean);
    if (own && square && datum === 'scale') found.set(field, bestScale({ error: own.L2, exact: own.exact.L2, value: square.L2 }));
  }
  return found;
}

/** The second reading, with every constant and factor removed; null where nothing is free. */
export function planSecondReading(reading: GridReading, definition: CaseDefinition, datums: ReadonlyMap<string, number>): GridReading | null {
  if (datums.size === 0) return null;
  const fields = reading.fields.flatMap(({ field, compare = field }): ReadField[] => {
    const [value, datum] = [datums.get(field), datumOf(definition, field)];
    if (value === undefined) return [];
    return [{ field, compare: datum === 'mean' ? `(${compare}) + (${value})` : `(${compare}) / (${value})` }];
  });
  return { ...reading, fields, mesh: undefined };
}

function datumOf(definition: CaseDefinition, field: string): DeclaredField['datum'] {
  return definition.fields.find((each) => each.field === field)?.datum ?? 'none';
}

/** The norms of the declared fields: those of the second reading where a datum was removed, and of gradients. */
export function joinNorms(definition: CaseDefinition, first: GridNorms, { second, datums }: { second: GridNorms | null; datums: ReadonlyMap<string, number> }): GridNorms {
  const declared = definition.fields.map(({ field }) => field);
  const fields = first.fields.filter(({ field }) => declared.includes(field)).map((own): FieldNorms => {
    const again = second?.fields.find(({ field }) => field === own.field);
    const [value, kind] = [datums.get(own.field), datumOf(definition, own.field)];
    if (!again || value === undefined || (kind !== 'mean' && kind !== 'scale')) return own;
    const factor = kind === 'scale' ? Math.abs(value) : 1;
    return {
      ...again, L1: again.L1 * factor, L2: again.L2 * factor, Linf: again.Linf * factor, mean: again.mean * (kind === 'scale' ? value : 1),
      exact: own.exact, min: own.min, max: own.max, maxAbs: own.maxAbs, datum: { kind, value },
    };
  });
  const gradients = declared.flatMap((field): GradientNorms[] => {
    const parts = axes.flatMap((axis) => first.fields.find((each) => each.field === derivativeName(field, axis)) ?? []);
    return parts.length === 0 ? [] : [{
      field, H1: Math.hypot(...parts.map(({ L2 }) => L2)), exactH1: Math.hypot(...parts.map(({ exact }) => exact.L2)),
      maxAbs: Math.max(...parts.map(({ maxAbs }) => maxAbs)), significantDigits: parts.reduce<number | null>((most, { significantDigits }) => (significantDigits === null ? most : Math.max(most ?? 0, significantDigits)), null),
      ...(parts.some(({ storedAs }) => storedAs === 'single') && { storedAs: 'single' as const }),
    }];
  });
  return { ...first, fields, ...(gradients.length > 0 && { gradients }) };
}
