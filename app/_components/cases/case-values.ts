import type { CaseDefinition, CaseKind, DeclaredField, DeclaredNorm, DeclaredQuantity } from '@/lib/domain/cases/definition';
import { norms, type Norm, type Procedure } from '@/lib/numerics/assessment';
import type { Case } from '@/lib/domain/cases/schema';

type PlannedGrid = CaseDefinition['gridPlan'][number];
export type SpacingAs = 'cellsPerDirection' | 'cells' | 'h';

/** One norm of a field as it is typed; `kept` holds what the form does not ask for. */
export interface NormValues { norm: Norm; formalOrder: string; tolerance: string; derivedOrder: string; regularity: string; logFactor: string; exactLimit: string; counts: boolean; kept: DeclaredNorm | null }
export interface FieldValues { field: string; citation: string; compare: string; datum: DeclaredField['datum']; norms: NormValues[]; kept: DeclaredField | null }
export interface QuantityValues { name: string; unit: string; formalOrder: string; knownValue: string; target: string; procedure: Procedure; uNumFactor: string; kept: DeclaredQuantity | null }
export interface GridValues { label: string; spacing: string; dt: string; kept: PlannedGrid | null }

/** A case as it is typed. */
export interface CaseValues {
  code: string; problem: string; name: string; slug: string; kind: CaseKind;
  options: { name: string; text: string }[];
  fields: FieldValues[]; quantities: QuantityValues[];
  sampling: '' | NonNullable<CaseDefinition['sampling']>; sourceSampling: '' | NonNullable<CaseDefinition['sampling']>; elementDegree: string; minimumGrids: string;
  spacingAs: SpacingAs; gridPlan: GridValues[];
  requirements: string;
}

const text = (value: number | undefined) => (value === undefined ? '' : String(value));

export function newField(field: string): FieldValues {
  const empty = norms.map((norm) => ({
    norm, formalOrder: '', tolerance: '', derivedOrder: '', regularity: '', logFactor: '', exactLimit: '', counts: norm !== 'H1' && norm !== 'energy', kept: null,
  }));
  return { field, citation: '', compare: '', datum: 'none', norms: empty, kept: null };
}

export const newQuantity: QuantityValues = { name: '', unit: '', formalOrder: '', knownValue: '', target: '', procedure: 'three-grid', uNumFactor: '', kept: null };
export const newGrid: GridValues = { label: '', spacing: '', dt: '', kept: null };

export function emptyCase(given: { code: string; problem: string }): CaseValues {
  return {
    ...given, name: '', slug: '', kind: 'order', options: [], fields: [], quantities: [], sampling: '', sourceSampling: '', elementDegree: '', minimumGrids: '',
    spacingAs: 'cellsPerDirection', gridPlan: [], requirements: '',
  };
}

function valuesOfField(field: DeclaredField): FieldValues {
  const cited = field.norms.map(({ backing }) => backing).find((backing) => backing !== undefined && 'citation' in backing);
  return {
    field: field.field, compare: field.compare ?? '', datum: field.datum, citation: cited && 'citation' in cited ? cited.citation : '', kept: field,
    norms: norms.map((norm) => {
      const kept = field.norms.find((each) => each.norm === norm) ?? null;
      return {
        norm, kept, formalOrder: text(kept?.formalOrder), tolerance: text(kept?.tolerance), derivedOrder: text(kept?.derivedOrder),
        regularity: text(kept?.regularity), logFactor: text(kept?.logFactor),        exactLimit: text(kept?.exactLimit), counts: kept?.counts ?? false,
      };
    }),
  };
}

function spacingText(grid: PlannedGrid, spacingAs: SpacingAs): string {
  const value = grid[spacingAs];
  return Array.isArray(value) ? value.join(' × ') : text(value);
}

export function valuesOfCase(found: Case): CaseValues {
  const first = found.gridPlan[0];
  const spacingAs = (['cellsPerDirection', 'cells', 'h'] as const).find((each) => first?.[each] !== undefined) ?? 'cellsPerDirection';
  return {
    code: found.code.slug, problem: found.problem.slug, name: found.name, slug: found.slug, kind: found.kind,
    options: Object.entries(found.options).map(([name, option]) => ({ name, text: option })),
    fields: found.fields.map(valuesOfField),
    quantities: found.quantities.map((kept) => ({
      name: kept.name, unit: kept.unit ?? '', formalOrder: text(kept.formalOrder), knownValue: text(kept.knownValue), target: text(kept.target),
      procedure: kept.procedure, uNumFactor: text(kept.uNumFactor), kept,
    })),
    sampling: found.sampling ?? '', sourceSampling: found.sourceSampling ?? '', elementDegree: text(found.elements?.degree), minimumGrids: text(found.minimumGrids),
    spacingAs, gridPlan: found.gridPlan.map((kept) => ({ label: kept.label, spacing: spacingText(kept, spacingAs), dt: text(kept.dt), kept })),
    requirements: found.requirements.join('\n'),
  };
}
