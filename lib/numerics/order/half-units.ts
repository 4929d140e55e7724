import { printedResolution } from './printed-resolution';

/**
 * What printing may have cut off each value: half the resolution stated with it, or half a unit of the finest decimal
 * seen in the quantity over all grids. In the quantity's unit, in the order of the grids.
 */
export function halfUnits(grids: readonly { value: number; resolution: number | null }[]): number[] {
  const printed = printedResolution(grids.map((grid) => grid.value));
  return grids.map((grid) => (grid.resolution ?? printed) / 2);
}
