import type { QuantityAssessment } from '../../numerics/assessment';

/** The value that the extrapolation gives at a spacing, φ(h) = φ₀ + (φ₁ − φ₀)(h/h₁)ᵖ; null where nothing was extrapolated. */
export function extrapolationCurve(quantity: QuantityAssessment): ((h: number) => number) | null {
  const { extrapolated, orderUsed, values } = quantity;
  const finest = values[0];
  if (extrapolated === null || orderUsed === null || !(orderUsed > 0) || !finest) return null;
  return (h) => extrapolated + (finest.value - extrapolated) * (h / finest.h) ** orderUsed;
}
