import { columnMappingSchema, type ColumnMapping } from '@/lib/domain/columns/column-mapping';
import type { UploadPreview } from '@/lib/domain/uploads/schema';

/** What must have a column before a file can be read: the coordinates, the weight, the time where nothing else states it, the fields. */
export interface ColumnNeed { key: string; kind: 'coordinate' | 'weight' | 'field' }

/** The choice that says every row weighs the same; no column can be called so. */
export const equalWeights = ' equal';

interface Needs { dimension: number; needsTime: boolean; fields: readonly string[] }

export function columnNeeds({ dimension, needsTime, fields }: Needs): ColumnNeed[] {
  const coordinates = [...['x', 'y', 'z'].slice(0, dimension), ...(needsTime ? ['t'] : [])];
  return [
    ...coordinates.map((key): ColumnNeed => ({ key, kind: 'coordinate' })),
    { key: 'weight', kind: 'weight' },
    ...fields.map((key): ColumnNeed => ({ key: `field ${key}`, kind: 'field' })),
  ];
}

/** The choices to begin with: the mapping in force, else what names propose. Nothing is chosen that the file does not have. */
export function firstChoices(needs: readonly ColumnNeed[], { mapping, proposal, header }: Pick<UploadPreview, 'mapping' | 'proposal' | 'header'>): Record<string, string> {
  const known = { ...proposal, ...mapping, fields: { ...proposal.fields, ...mapping?.fields } };
  const columnOf = ({ key, kind }: ColumnNeed): string | null | undefined => {
    if (kind === 'field') return [known.fields[key.slice('field '.length)]].flat()[0];
    return known[key as 'x' | 'y' | 'z' | 't' | 'weight'];
  };
  return Object.fromEntries(needs.map((need) => {
    const column = columnOf(need);
    if (column === null) return [need.key, equalWeights];
    return [need.key, column !== undefined && header.includes(column) ? column : ''];
  }));
}

/** The mapping that the choices come to, with what was mapped besides kept; null while something has no column. */
export function mappingOf(choices: Readonly<Record<string, string>>, kept: ColumnMapping | null): ColumnMapping | null {
  if (Object.values(choices).some((column) => column === '')) return null;
  const coordinates = Object.fromEntries(Object.entries(choices).filter(([key]) => key !== 'weight' && !key.startsWith('field ')));
  const fields = Object.fromEntries(Object.entries(choices).flatMap(([key, column]) => (key.startsWith('field ') ? [[key.slice('field '.length), withGradient(column, kept?.fields[key.slice('field '.length)])]] : [])));
  const weight = choices.weight === equalWeights ? null : choices.weight;
  const parsed = columnMappingSchema.safeParse({ ...kept, ...coordinates, weight, fields: { ...kept?.fields, ...fields } });
  return parsed.success ? parsed.data : null;
}

/** Columns of a gradient mapped besides stay with the field. */
function withGradient(column: string, kept: string | string[] | undefined): string | string[] {
  return Array.isArray(kept) ? [column, ...kept.slice(1)] : column;
}
