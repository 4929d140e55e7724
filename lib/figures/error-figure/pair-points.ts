import type { FieldAssessment } from '../../numerics/assessment';

export interface PairPoint { coarse: string; fine: string; h: number; order: number; uncertainty: number | null; isUsed: boolean }

/** The observed order of each pair of grids, placed between the two at √(h·h′), finest first. */
export function pairPoints({ grids, orders }: FieldAssessment): PairPoint[] {
  const points = orders.flatMap(({ coarse, fine, order, uncertainty }): PairPoint[] => {
    const ends = [coarse, fine].map((label) => grids.find((grid) => grid.label === label));
    const [first, second] = ends;
    if (!first || !second || order === null || !Number.isFinite(order)) return [];
    return [{ coarse, fine, h: Math.sqrt(first.h * second.h), order, uncertainty, isUsed: first.used && second.used }];
  });
  return points.sort((a, b) => a.h - b.h);
}
