import type { CaseDefinition } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { splitColumns } from '@/lib/domain/columns/split-columns';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';
import type { FieldNorms, GradientNorms, GridNorms } from '@/lib/numerics/norms/grid-norms';
import type { ErrorMap } from '@/lib/numerics/maps/error-map';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { GridReading } from '@/lib/readers/grid-reading';
import { planRigid, withoutDatum, type FoundDatum } from './datums';
import { derivativeName, squareName } from './names-in-reading';
import type { PartsAsked } from './plan-parts';

type Asked = Pick<PartsAsked, 'definition' | 'problem' | 'mapping' | 'grid'>;
type ReadField = GridReading['fields'][number];

const axes = ['x', 'y', 'z'] as const;

/**
 * What is read of a file: every field against what it is compared with, its gradient columns against the derivatives of
 * the exact field, and what the best factor of a field up to a scale is made of.
 */
export function planReading({ definition, problem, mapping, grid: { t, cellsPerDirection } }: Asked): GridReading {
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
    rigid: planRigid(definition, problem, columns),
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

/** The norms of the declared fields: those of the second reading where a datum was removed, and of gradients. */
export function joinNorms(definition: CaseDefinition, first: GridNorms, { second, datums }: { second: GridNorms | null; datums: ReadonlyMap<string, FoundDatum> }): GridNorms {
  const declared = definition.fields.map(({ field }) => field);
  const removed = (field: string) => second?.fields.find((each) => each.field === field);
  const fields = first.fields.filter(({ field }) => declared.includes(field)).map((own): FieldNorms => {
    const [again, datum] = [removed(own.field), datums.get(own.field)];
    return again && datum ? withoutDatum(own, again, datum) : own;
  });
  const gradients = declared.flatMap((field): GradientNorms[] => {
    const parts = axes.flatMap((axis) => {
      const name = derivativeName(field, axis);
      const own = first.fields.find((each) => each.field === name);
      return own ? [{ ...own, L2: removed(name)?.L2 ?? own.L2 }] : [];
    });
    return parts.length === 0 ? [] : [{
      field, H1: Math.hypot(...parts.map(({ L2 }) => L2)), exactH1: Math.hypot(...parts.map(({ exact }) => exact.L2)),
      maxAbs: Math.max(...parts.map(({ maxAbs }) => maxAbs)), significantDigits: parts.reduce<number | null>((most, { significantDigits }) => (significantDigits === null ? most : Math.max(most ?? 0, significantDigits)), null),
      ...(parts.some(({ storedAs }) => storedAs === 'single') && { storedAs: 'single' as const }),
    }];
  });
  const regions = first.regions?.map((part) => {
    const again = second?.regions?.find(({ region }) => region === part.region) ?? null;
    return { ...joinNorms(definition, part, { second: again, datums }), region: part.region };
  });
  return { ...first, fields, ...(gradients.length > 0 && { gradients }), ...(regions && { regions }) };
}

/** The maps of the declared fields: after a datum was removed those of the second reading, of a scaled field in the exact one's size. */
export function joinMaps(first: readonly ErrorMap[], second: readonly ErrorMap[], datums: ReadonlyMap<string, FoundDatum>): ErrorMap[] {
  return [...first, ...second.map((map) => {
    const datum = datums.get(map.field);
    return datum?.kind === 'scale' ? { ...map, largest: map.largest * Math.abs(datum.value) } : map;
  })];
}
