import type { Convergence, QuantitySeries } from '../assessment';
import { convergenceType } from '../convergence/convergence-type';
import { halfUnits } from '../order/half-units';
import { gridTriple, type GridTriple } from '../order/grid-triple';
import { threeGridOrder } from '../order/three-grid-order';
import { chainGrids } from '../spacing/chain-grids';

export interface PrintedGrid { label: string; h: number; value: number; halfUnit: number }

/** Three successive grids, what they do, and the order seen on them: null where there is none. */
export interface QuantityTriple {
  grids: readonly [PrintedGrid, PrintedGrid, PrintedGrid];
  differences: GridTriple;
  convergence: Convergence;
  order: number | null;
  isOutOfRange: boolean;
}

/**
 * The successive triples of a quantity, finest first, over grids chained at a ratio of 1.3 or more. Where that leaves
 * fewer than three of three or more, the grids as they are: the figures are then shown, and the outcome says why they
 * are too close. `grids` are those used, and `areApart` whether they keep the ratio.
 */
export function quantityTriples({ grids }: QuantitySeries): { grids: PrintedGrid[]; triples: QuantityTriple[]; areApart: boolean } {
  const halves = halfUnits(grids);
  const printed = grids.map(({ label, h, value }, index) => ({ label, h, value, halfUnit: halves[index] ?? 0 }));
  const chain = chainGrids(grids.map((grid) => grid.h)).flatMap((index) => printed[index] ?? []);
  const areApart = chain.length >= Math.min(3, grids.length);
  const used = areApart ? chain : printed;
  const triples = used.slice(2).flatMap((coarse, index) => {
    const [fine, middle] = [used[index], used[index + 1]];
    return fine && middle ? [tripleOf([fine, middle, coarse])] : [];
  });
  return { grids: used, triples, areApart };
}

function tripleOf(grids: QuantityTriple['grids']): QuantityTriple {
  const differences = gridTriple(...grids);
  const convergence = convergenceType(differences, [grids[0].halfUnit, grids[1].halfUnit, grids[2].halfUnit]);
  const found = convergence === 'unchanged' ? null : threeGridOrder(differences);
  return {
    grids, differences, convergence, order: found?.order ?? null,
    isOutOfRange: found?.order === null && found.reason === 'order-out-of-range',
  };
}
