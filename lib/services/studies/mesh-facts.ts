import type { MeshSurvey } from '@/lib/numerics/mesh/mesh-part';

/** Of what is known of a mesh, what is answered. */
export function meshFacts({ low, high, duplicates }: MeshSurvey): Pick<MeshSurvey, 'low' | 'high' | 'duplicates'> {
  return { low, high, duplicates };
}
