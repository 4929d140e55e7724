import type { CaseDefinition } from '@/lib/domain/cases/definition';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';
import { bestScale } from '@/lib/numerics/norms/best-scale';
import type { FieldNorms, GridNorms } from '@/lib/numerics/norms/grid-norms';
import { motionComponent, type RigidMotion } from '@/lib/numerics/rigid/rigid-motion';
import type { GridReading } from '@/lib/readers/grid-reading';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { derivativeName, squareName } from './names-in-reading';

const axes = ['x', 'y', 'z'] as const;

/** What is free in a field, as the first reading found it, and what the field is compared with once that is removed. */
export interface FoundDatum {
  kind: 'mean' | 'scale' | 'rigid';
  value: number;
  compare: (text: string) => string;
}

/** Fields that are the components of a displacement known up to a rigid motion, in the order of the directions. */
function rigidFields({ fields }: Pick<CaseDefinition, 'fields'>): string[] {
  return fields.filter(({ datum }) => datum === 'rigid').map(({ field }) => field);
}

/**
 * What to gather for a rigid motion: coordinates are taken from the middle of the box, where there is one. `columns` are those
 * of values; throws RejectedFile where a component has none.
 */
export function planRigid(definition: CaseDefinition, { dimension, domain }: ProblemDefinition, columns: Readonly<Record<string, string>>): GridReading['rigid'] {
  const fields = rigidFields(definition);
  if (fields.length !== dimension) return undefined;
  const missing = fields.filter((field) => columns[field] === undefined);
  if (missing.length > 0) {
    throw new RejectedFile([{
      code: 'column-missing', count: missing.length, line: null, column: null,
      found: 'gradients without the displacement that its rigid motion is found by', expected: missing.join(', '),
    }]);
  }
  return { fields, origin: axes.slice(0, dimension).map((axis) => { const [from, to] = domain?.[axis] ?? [0, 0]; return (from + to) / 2; }) };
}

/** What the first reading found to be free in each field, by field: the constant, the factor or the rigid motion that fits best. */
export function findDatums(definition: CaseDefinition, norms: GridNorms): Map<string, FoundDatum> {
  const found = new Map<string, FoundDatum>();
  const components = rigidFields(definition);
  for (const { field, datum } of definition.fields) {
    const [own, square] = [field, squareName(field)].map((name) => norms.fields.find((each) => each.field === name));
    if (own && datum === 'mean') found.set(field, { kind: 'mean', value: own.mean, compare: (text) => `(${text}) + (${own.mean})` });
    if (own && square && datum === 'scale') {
      const value = bestScale({ error: own.L2, exact: own.exact.L2, value: square.L2 });
      found.set(field, { kind: 'scale', value, compare: (text) => `(${text}) / (${value})` });
    }
    if (own && datum === 'rigid' && norms.motion) addMotion(found, { field, motion: norms.motion, at: components.indexOf(field) });
  }
  return found;
}

/** A component of the motion, and the derivatives of it, which the gradient of the field has in addition. */
function addMotion(found: Map<string, FoundDatum>, { field, motion, at }: { field: string; motion: RigidMotion; at: number }): void {
  const { value, gradient } = motionComponent(motion, at);
  const terms = gradient.flatMap((slope, axis) => (slope === 0 ? [] : [` + (${slope}) * (${axes[axis] ?? 'x'} - (${motion.centre[axis] ?? 0}))`]));
  found.set(field, { kind: 'rigid', value, compare: (text) => `(${text}) + (${value})${terms.join('')}` });
  gradient.forEach((slope, axis) => {
    found.set(derivativeName(field, axes[axis] ?? 'x'), { kind: 'rigid', value: slope, compare: (text) => `(${text}) + (${slope})` });
  });
}

/** The second reading, with all that is free removed; null where nothing is. */
export function planSecondReading(reading: GridReading, datums: ReadonlyMap<string, FoundDatum>): GridReading | null {
  if (datums.size === 0) return null;
  const fields = reading.fields.flatMap(({ field, compare = field }) => {
    const datum = datums.get(field);
    return datum === undefined ? [] : [{ field, compare: datum.compare(compare) }];
  });
  return { ...reading, fields, mesh: undefined, rigid: undefined };
}

/** Norms of a field with what was removed: those of the second reading, of a scaled one in the exact field's size. */
export function withoutDatum(own: FieldNorms, again: FieldNorms, { kind, value }: FoundDatum): FieldNorms {
  const factor = kind === 'scale' ? value : 1;
  const size = Math.abs(factor);
  return {
    ...again, L1: again.L1 * size, L2: again.L2 * size, Linf: again.Linf * size, mean: again.mean * factor,
    exact: own.exact, min: own.min, max: own.max, maxAbs: own.maxAbs, datum: { kind, value },
  };
}
