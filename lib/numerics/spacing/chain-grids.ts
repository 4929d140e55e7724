/** Celik et al., J. Fluids Eng. 130 (2008) 078001: refine by more than 1.3 from one grid to the next. */
const minimumRatio = 1.3;
/** Spacings such as (V/N)^(1/D) are rounded; a stated ratio of 1.3 must still count as one. */
const roundingSlack = 1e-9;

/**
 * Picks the grids whose spacings lie far enough apart to read an order from: from the finest on, each with the nearest
 * coarser one at a ratio of 1.3 or more, whose coarse grid is the next pair's fine one.
 *
 * `spacings`: h, finest first, any unit of length or time. Returns the indices of the grids picked, finest first; fewer
 * than two where no pair reaches the ratio.
 */
export function chainGrids(spacings: readonly number[]): number[] {
  const chain: number[] = [];
  let fine = 0;
  spacings.forEach((h, index) => {
    if (index === 0 || h / fine >= minimumRatio * (1 - roundingSlack)) {
      chain.push(index);
      fine = h;
    }
  });
  return chain;
}
