import type { GridTriple } from './grid-triple';

const mostSteps = 500;
const settled = 1e-12;

/**
 * What the fixed point of I. B. Celik et al., J. Fluids Eng. 130 (2008) 078001 gives where the three values oscillate:
 * p = |ln|ε32/ε21| + q(p)|/ln r21 with q(p) = ln[(r21^p − s)/(r32^p − s)], s = −1.
 *
 * A figure that readers of the paper expect, and no order: oscillating values have none. Returns null where ε21/ε32 is
 * not negative, or the steps do not settle.
 */
export function oscillatingFormula({ e21, e32, r21, r32 }: GridTriple): number | null {
  if (!(e21 / e32 < 0) || e32 === 0) return null;
  const logRatio = Math.log(Math.abs(e32 / e21));
  const log21 = Math.log(r21);
  let p = Math.abs(logRatio) / log21;
  for (let step = 0; step < mostSteps; step += 1) {
    const next = Math.abs(logRatio + Math.log((r21 ** p + 1) / (r32 ** p + 1))) / log21;
    if (!Number.isFinite(next)) return null;
    if (Math.abs(next - p) <= settled * Math.max(1, p)) return next;
    p = next;
  }
  return null;
}
