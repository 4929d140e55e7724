import type { FieldAssessment, SeriesNorm } from '../assessment';
import { regionsOfBand, type BandName } from '../regions/bands';

/** How the error of a field falls along the boundary and inside, over the last pair of grids. */
export interface BoundaryEvidence {
  norm: SeriesNorm;
  boundaryOrder: number;
  interiorOrder: number;
  /** Whether on the finest grid the larger error lies along the boundary. */
  isLargerAtBoundary: boolean;
}

/** In which bands and norms to look, the first that there are orders of. */
const bands: readonly BandName[] = ['2h', 'fixed'];
const looked: readonly SeriesNorm[] = ['L2', 'L1', 'Linf'];
const sizes: readonly SeriesNorm[] = ['Linf', 'L2', 'L1'];

/** What the parts of the domain show of a field; null where no band has orders on both sides of it. */
export function boundaryEvidence(field: string, assessments: readonly FieldAssessment[]): BoundaryEvidence | null {
  for (const name of bands) {
    const pairOf = (norm: SeriesNorm) => {
      const { interior, boundary } = regionsOfBand(name);
      const part = (region: string) => assessments.find((each) => each.field === field && each.norm === norm && each.region === region);
      return { boundary: part(boundary), interior: part(interior) };
    };
    const larger = sizes.map(pairOf).find(({ boundary, interior }) => boundary?.grids[0] && interior?.grids[0]);
    for (const norm of looked) {
      const { boundary, interior } = pairOf(norm);
      const [boundaryOrder, interiorOrder] = [boundary?.orders[0]?.order, interior?.orders[0]?.order];
      if (typeof boundaryOrder !== 'number' || typeof interiorOrder !== 'number') continue;
      return { norm, boundaryOrder, interiorOrder, isLargerAtBoundary: (larger?.boundary?.grids[0]?.error ?? 0) >= (larger?.interior?.grids[0]?.error ?? 0) };
    }
  }
  return null;
}
