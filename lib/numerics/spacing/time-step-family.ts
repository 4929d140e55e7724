interface SteppedGrid { h: number; dt: number }

/** Steps this close to a power of the spacing, relative to them, are rounded ones. */
const fitsWithin = 0.02;

export type TimeStepFamily = { kind: 'fixed' } | { kind: 'power'; exponent: number } | { kind: 'free' };

/**
 * How the time step goes with the spacing over a series refined in space: held (`fixed`: its error is a floor that looks
 * like a stall), bound to a power of it (`power`: Δt ∝ h^s, so that an order q in time shows as s·q), or neither.
 * Null with fewer than two grids.
 */
export function timeStepFamily(grids: readonly SteppedGrid[]): TimeStepFamily | null {
  const sorted = [...grids].sort((left, right) => left.h - right.h);
  const [finest, coarsest] = [sorted[0], sorted.at(-1)];
  if (!finest || !coarsest || finest.h === coarsest.h) return null;
  const exponent = Math.log(coarsest.dt / finest.dt) / Math.log(coarsest.h / finest.h);
  const isBound = sorted.every(({ h, dt }) => Math.abs(dt / (finest.dt * (h / finest.h) ** exponent) - 1) <= fitsWithin);
  if (!isBound) return { kind: 'free' };
  return Math.abs(exponent) < fitsWithin ? { kind: 'fixed' } : { kind: 'power', exponent };
}
