import type { MeshPart, MeshSurvey } from '@/lib/numerics/mesh/mesh-part';
import { createMeshGatherer } from '@/lib/numerics/mesh/mesh-gatherer';
import { createMeshTotal } from '@/lib/numerics/mesh/mesh-total';

/** Cells of a mesh: the centre and the volume of each. */
export interface MeshCells { centres: number[][]; volumes: number[] }

/** Edges from a to b at which f maps equal parts of [0, 1]. */
export function edges(n: number, f: (s: number) => number = (s) => s): number[] {
  return Array.from({ length: n + 1 }, (_, i) => f(i / n));
}

/** Cells of the tensor product of edges along each direction. */
export function tensorCells(...axes: number[][]): MeshCells {
  return axes.reduce<MeshCells>((cells, ends) => {
    const made: MeshCells = { centres: [], volumes: [] };
    for (let i = 0; i + 1 < ends.length; i += 1) {
      const [from, to] = [ends[i] ?? 0, ends[i + 1] ?? 0];
      cells.centres.forEach((centre, at) => {
        made.centres.push([...centre, (from + to) / 2]);
        made.volumes.push((cells.volumes[at] ?? 1) * (to - from));
      });
    }
    return made;
  }, { centres: [[]], volumes: [1] });
}

/** Parts of the survey of some cells, in so many chunks of two blocks. */
export function surveyParts({ centres, volumes }: MeshCells, chunks = 1, hasWeights = true): { part: MeshPart; rows: number }[] {
  const dimension = centres[0]?.length ?? 1;
  const gatherer = createMeshGatherer(dimension);
  const size = Math.ceil(centres.length / chunks);
  return Array.from({ length: chunks }, (_, chunk) => {
    const [from, to] = [chunk * size, Math.min((chunk + 1) * size, centres.length)];
    const middle = Math.ceil((from + to) / 2);
    for (const [start, end] of [[from, middle], [middle, to]] as const) {
      const some = centres.slice(start, end);
      gatherer.add({
        rows: some.length, coordinates: Array.from({ length: dimension }, (__, axis) => Float64Array.from(some, (centre) => centre[axis] ?? 0)),
        times: null, weights: hasWeights ? Float64Array.from(volumes.slice(start, end)) : null, extents: [],
      });
    }
    const part = gatherer.takePart();
    return part ? [{ part, rows: to - from }] : [];
  }).flat();
}

export function surveyOf(cells: MeshCells, chunks = 1): MeshSurvey {
  const total = createMeshTotal();
  for (const { part, rows } of surveyParts(cells, chunks)) total.add(part, rows);
  const found = total.finish();
  if (!found) throw new Error('a survey of no cells');
  return found;
}
