import type { FieldGrid, PairOrder } from '../assessment';
import { pairwiseOrder } from '../order/pairwise-order';
import { chainGrids } from '../spacing/chain-grids';

/** Observed order of each pair of chained grids (ratio 1.3 or more), finest pair first; `grids` run finest first. */
export function pairOrders(grids: readonly FieldGrid[]): PairOrder[] {
  const chain = chainGrids(grids.map((grid) => grid.h)).flatMap((index) => grids[index] ?? []);
  return chain.slice(1).flatMap((coarse, index) => {
    const fine = chain[index];
    return fine ? [{ coarse: coarse.label, fine: fine.label, ratio: coarse.h / fine.h, ...pairwiseOrder(coarse, fine) }] : [];
  });
}
