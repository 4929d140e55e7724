import { flatAxes } from '@/lib/numerics/mesh/flat-axes';
import { judgeSimilarity, type Similarity, type SurveyedGrid } from '@/lib/numerics/mesh/judge-similarity';
import type { MeshSurvey } from '@/lib/numerics/mesh/mesh-part';
import type { CaseDefinition } from '../cases/definition';
import { cellCount } from '../studies/cell-count';
import type { GridInput } from '../studies/input';
import { hasNodes, type Box } from './has-nodes';
import type { PlacedGrid, StudyGrid } from './study-to-assess';

interface Space { dimension: number; volume: number | null; box?: Box | null }

/**
 * The dimension that a study is refined in: directions that are one cell thick on every grid count for nothing, and the
 * volume is divided by the length along them. A grid of which neither counts along directions nor rows tell is not thin.
 */
export function refinedSpace(grids: readonly StudyGrid[], { dimension, volume, box }: Space): { dimension: number; volume: number | null; thin: number[] } {
  const perGrid = grids.map(({ grid, norms }) => thinAxes(grid, norms?.mesh, dimension));
  const thin = (perGrid[0] ?? []).filter((axis) => perGrid.every((axes) => axes.includes(axis)));
  if (thin.length === 0 || thin.length >= dimension) return { dimension, volume, thin: [] };
  const lengths = thin.map((axis) => box?.[(['x', 'y', 'z'] as const)[axis] ?? 'x']).map((side) => (side ? side[1] - side[0] : 1));
  return { dimension: dimension - thin.length, volume: volume === null ? null : lengths.reduce((left, length) => left / length, volume), thin };
}

function thinAxes({ cellsPerDirection }: GridInput, survey: MeshSurvey | undefined, dimension: number): number[] {
  if (Array.isArray(cellsPerDirection)) return cellsPerDirection.flatMap((count, axis) => (count === 1 ? [axis] : []));
  if (cellsPerDirection !== undefined || survey?.low.length !== dimension) return [];
  return flatAxes(survey);
}

/** How alike the grids of a study are refined, the finest first; null where nothing tells. */
export function studySimilarity({ sampling }: Pick<CaseDefinition, 'sampling'>, placed: readonly PlacedGrid[], { dimension, box }: Space): Similarity | null {
  return judgeSimilarity(placed.map(({ grid, norms, h }): SurveyedGrid => {
    const { cellsPerDirection } = grid;
    const survey = norms?.mesh ?? null;
    const isNodal = survey !== null && hasNodes(survey, box ?? null);
    const areCells = sampling === 'average' || (sampling !== 'quadrature' && norms !== null && cellCount(grid, dimension) === norms.rows && !isNodal);
    return { label: grid.label, h, survey, isSized: areCells && norms?.equalWeights === false, counts: Array.isArray(cellsPerDirection) ? cellsPerDirection : null };
  }));
}
