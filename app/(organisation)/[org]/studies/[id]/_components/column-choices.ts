import type { CaseDefinition } from '@/lib/domain/cases/definition';
import { columnMappingSchema, type ColumnMapping } from '@/lib/domain/columns/column-mapping';
import type { GivenDialect } from '@/lib/domain/columns/given-dialect';
import { resolveColumn } from '@/lib/domain/columns/resolve-column';
import { splitColumns } from '@/lib/domain/columns/split-columns';
import type { UploadPreview } from '@/lib/domain/uploads/schema';

const axes = ['x', 'y', 'z'] as const;
const ofRegions = ['distance', 'flag'] as const;
type Axis = (typeof axes)[number];

/** Something that is read from a column: what every reading needs, and what only some do. */
export interface ColumnNeed {
  key: string;
  kind: 'coordinate' | 'time' | 'weight' | 'value' | 'gradient' | 'size' | 'region';
  /** Of a value or a gradient. */
  field?: string;
  /** Of a coordinate, a gradient or a size. */
  axis?: Axis;
  /** The file may be without it. */
  mayLack: boolean;
}

/** The choices that are no column; no column can be called so. */
export const equalWeights = ' equal';
export const noColumn = ' none';

interface Asked {
  dimension: number;
  /** Whether the time stands nowhere else. */
  needsTime: boolean;
  definition: Pick<CaseDefinition, 'fields' | 'sampling'>;
}

export function columnNeeds({ dimension, needsTime, definition }: Asked): ColumnNeed[] {
  const directions = axes.slice(0, dimension);
  const gradients = definition.fields.filter(({ norms }) => norms.some(isOfGradient));
  return [
    ...directions.map((axis): ColumnNeed => ({ key: axis, kind: 'coordinate', axis, mayLack: false })),
    ...(needsTime ? [{ key: 't', kind: 'time', mayLack: false } satisfies ColumnNeed] : []),
    { key: 'weight', kind: 'weight', mayLack: false },
    ...definition.fields.map(({ field, norms }): ColumnNeed => ({ key: `value ${field}`, kind: 'value', field, mayLack: norms.every(isOfGradient) })),
    ...gradients.flatMap(({ field }) => directions.map((axis): ColumnNeed => ({ key: `gradient ${field} ${axis}`, kind: 'gradient', field, axis, mayLack: true }))),
    ...(definition.sampling === 'average' ? directions.map((axis): ColumnNeed => ({ key: `d${axis}`, kind: 'size', axis, mayLack: true })) : []),
    ...ofRegions.map((key): ColumnNeed => ({ key, kind: 'region', mayLack: true })),
  ];
}

const isOfGradient = ({ norm }: CaseDefinition['fields'][number]['norms'][number]) => norm === 'H1' || norm === 'energy';

export type Choices = Readonly<Record<string, string>>;
type Shown = Pick<UploadPreview, 'mapping' | 'proposal' | 'header'>;

/** What of a file is known by a name of its own, whether it is chosen or not. */
export function mapsItself({ kind, key }: ColumnNeed, header: readonly string[]): boolean {
  return (kind === 'region' || kind === 'size') && typeof resolveColumn(header, key) === 'number';
}

/** The choices to begin with: the mapping in force, else what names propose. Nothing is chosen that the file does not have. */
export function firstChoices(needs: readonly ColumnNeed[], { mapping, proposal, header }: Shown): Record<string, string> {
  const dimension = needs.filter(({ kind }) => kind === 'coordinate').length;
  const known = { ...proposal, ...mapping, fields: { ...proposal.fields, ...mapping?.fields } };
  const columnOf = ({ key, kind, field = '', axis = 'x' }: ColumnNeed): string | null | undefined => {
    if (kind !== 'value' && kind !== 'gradient') return known[key as Exclude<keyof ColumnMapping, 'fields' | 'table'>];
    const { value, gradient } = splitColumns(known.fields[field], dimension);
    return kind === 'value' ? value : gradient[axes.indexOf(axis)];
  };
  return Object.fromEntries(needs.map((need) => {
    const column = columnOf(need);
    if (column === null) return [need.key, equalWeights];
    if (column !== undefined && header.includes(column)) return [need.key, column];
    // Gradients are asked for: that a file has none is said, not assumed, unless the mapping in force says so.
    const isAsked = need.kind === 'gradient' && mapping?.fields[need.field ?? ''] === undefined;
    return [need.key, need.mayLack && !isAsked && column === undefined ? noColumn : ''];
  }));
}

/** What is wrong with each choice; nothing where all are made. */
export function choiceFaults(needs: readonly ColumnNeed[], choices: Choices): Map<string, string> {
  const faults = new Map<string, string>();
  for (const need of needs) {
    if ((choices[need.key] ?? '') === '') faults.set(need.key, 'No column. Choose the one that holds it.');
    else if (choices[need.key] === noColumn && isPartOfSome(need, needs, choices)) {
      faults.set(need.key, `No column, but one for another direction. Choose one for every direction, or for none.`);
    } else if (need.kind === 'value' && choices[need.key] === noColumn && gradientOf(need.field, needs, choices).length === 0) {
      faults.set(need.key, 'Neither a column of the field nor of its gradient. Choose one of them.');
    }
  }
  return faults;
}

function isPartOfSome({ kind, field }: ColumnNeed, needs: readonly ColumnNeed[], choices: Choices): boolean {
  if (kind !== 'gradient' && kind !== 'size') return false;
  return needs.some((each) => each.kind === kind && each.field === field && isColumn(choices[each.key]));
}

const isColumn = (choice: string | undefined): choice is string => choice !== undefined && choice !== '' && choice !== noColumn && choice !== equalWeights;

function gradientOf(field: string | undefined, needs: readonly ColumnNeed[], choices: Choices): string[] {
  return needs.filter((need) => need.kind === 'gradient' && need.field === field).flatMap(({ key }) => (isColumn(choices[key]) ? [choices[key]] : []));
}

/** The mapping that the choices come to, with what was mapped besides kept; null while something has no column. */
export function mappingOf(needs: readonly ColumnNeed[], { choices, kept, table }: { choices: Choices; kept: ColumnMapping | null; table: GivenDialect }): ColumnMapping | null {
  if (choiceFaults(needs, choices).size > 0) return null;
  const single = needs.filter(({ kind }) => kind !== 'value' && kind !== 'gradient');
  const columns = Object.fromEntries(single.map(({ key }) => [key, choices[key] === equalWeights ? null : choices[key] === noColumn ? undefined : choices[key]]));
  const fields = Object.fromEntries(needs.filter(({ kind }) => kind === 'value').flatMap(({ key, field = '' }) => {
    const value = isColumn(choices[key]) ? [choices[key]] : [];
    const asked = needs.some((need) => need.kind === 'gradient' && need.field === field);
    const mapped = [...value, ...(asked ? gradientOf(field, needs, choices) : keptGradient(kept, field))];
    return [[field, mapped.length === 1 && value.length === 1 ? value[0] : mapped]];
  }));
  const isSaid = Object.keys(table).length > 0;
  const parsed = columnMappingSchema.safeParse({ ...kept, ...columns, fields: { ...kept?.fields, ...fields }, table: isSaid ? table : undefined });
  return parsed.success ? parsed.data : null;
}

/** Columns of a gradient that was mapped where no norm asks for it stay with the field. */
function keptGradient(kept: ColumnMapping | null, field: string): string[] {
  const mapped = kept?.fields[field];
  return Array.isArray(mapped) ? mapped.slice(1) : [];
}
