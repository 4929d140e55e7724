import type { FieldProblem } from '@/lib/errors';
import type { DeclaredField } from './definition';

/** A rigid motion is one of all components of a displacement: fields known up to it are as many as directions, in their order. */
export function checkRigid(fields: readonly DeclaredField[], dimension: number): FieldProblem[] {
  const components = fields.flatMap(({ field, datum }, index) => (datum === 'rigid' ? [{ field, path: `fields.${index}.datum` }] : []));
  const [first] = components;
  if (first === undefined || components.length === dimension) return [];
  const names = components.map(({ field }) => field).join(', ');
  return [{
    path: first.path,
    message: `Found ${components.length === 1 ? `one field known up to a rigid motion, ${names}` : `${components.length} fields known up to a rigid motion, ${names}`}. Expected ${dimension}, the components of the displacement along ${['x', 'y', 'z'].slice(0, dimension).join(', ')} in that order.`,
  }];
}
