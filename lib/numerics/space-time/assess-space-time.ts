import type { SpaceTimeAssessment, SpaceTimeSeries } from '../assessment';
import { fitSpaceTime } from './fit-space-time';

const noFit = { A: null, p: null, B: null, q: null, rho: null, residual: null, spread: null };

/**
 * Orders in space and in time of one series (fitSpaceTime), and how much of the error on each grid is of either: the parts
 * Ah^p and BΔt^q. Members are null where the points do not suffice for a fit.
 */
export function assessSpaceTime({ field, norm, formalOrder, isSigned, points }: SpaceTimeSeries): SpaceTimeAssessment {
  const fit = fitSpaceTime(points, isSigned);
  const parts = points.map((point) => ({ ...point, space: fit && fit.A * point.h ** fit.p, time: fit && fit.B * point.dt ** fit.q }));
  const sorted = parts.sort((left, right) => left.h - right.h || left.dt - right.dt);
  return { field, norm, formalOrder, ...(fit ?? noFit), points: sorted };
}
