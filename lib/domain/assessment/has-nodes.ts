export type Box = Partial<Record<'x' | 'y' | 'z', readonly [number, number]>>;

/** Coordinates are printed in some digits. */
const reachesWithin = 1e-9;

/** Whether rows reach both ends of the box along some direction, as nodes do and centres of cells cannot. False without a box. */
export function hasNodes({ low, high }: { low: readonly number[]; high: readonly number[] }, box: Box | null): boolean {
  return (['x', 'y', 'z'] as const).some((axis, at) => {
    const [side, from, to] = [box?.[axis], low[at], high[at]];
    if (side === undefined || from === undefined || to === undefined) return false;
    const slack = reachesWithin * (side[1] - side[0]);
    return from <= side[0] + slack && to >= side[1] - slack;
  });
}
