import type { ErrorSeries, FieldGrid, PairOrder } from '../assessment';
import { differenceOrder } from '../order/difference-order';
import { pairwiseOrder } from '../order/pairwise-order';
import { chainGrids } from '../spacing/chain-grids';

/**
 * Observed order of each pair of chained grids (ratio 1.3 or more), finest pair first; `grids` run finest first. Of differences
 * of consecutive solutions, all of them: their grids were chained before they were compared.
 */
export function pairOrders(grids: readonly FieldGrid[], comparedTo: ErrorSeries['comparedTo']): PairOrder[] {
  if (comparedTo !== undefined) return differenceOrders(grids, comparedTo.h);
  const chain = chainGrids(grids.map((grid) => grid.h)).flatMap((index) => grids[index] ?? []);
  return chain.slice(1).flatMap((coarse, index) => {
    const fine = chain[index];
    return fine ? [{ coarse: coarse.label, fine: fine.label, ratio: coarse.h / fine.h, ...pairwiseOrder(coarse, fine) }] : [];
  });
}

function differenceOrders(grids: readonly FieldGrid[], coarsest: number): PairOrder[] {
  return grids.slice(1).flatMap((coarse, index) => {
    const fine = grids[index];
    if (!fine) return [];
    return [{ coarse: coarse.label, fine: fine.label, ratio: coarse.h / fine.h, ...differenceOrder(fine, coarse, grids[index + 2]?.h ?? coarsest) }];
  });
}
