/** A series that spans less than one halving shows too little of h^p to tell orders apart. */
const minimumSpan = 2;
const roundingSlack = 1e-9;

/** Whether the spacings (finest first) span a ratio of 2 from the finest to the coarsest. */
export function spansRatio(spacings: readonly number[]): boolean {
  const fine = spacings[0];
  const coarse = spacings.at(-1);
  return fine !== undefined && coarse !== undefined && coarse / fine >= minimumSpan * (1 - roundingSlack);
}
