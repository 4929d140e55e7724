import type { PairSimilarity, Similarity } from './mesh/judge-similarity';

/** The shapes that an assessment is computed from and answered in. Grids run from the finest to the coarsest. */

export const norms = ['L1', 'L2', 'Linf', 'H1', 'energy'] as const;
export type Norm = (typeof norms)[number];
export type SeriesNorm = Norm | 'value';
export type Outcome = 'pass' | 'fail' | 'inconclusive' | 'meets-target' | 'misses-target';

export const reasonCodes = [
  'exact', 'exact-not-declared', 'not-exact', 'too-few-grids', 'above-formal', 'errors-rise', 'departing', 'in-band',
  'one-pair-only', 'limit-below-formal', 'climbing', 'below-formal', 'left-band', 'scatter', 'within-uncertainty',
  'order-out-of-range', 'sampling-not-stated', 'not-similar', 'nothing-counts', 'no-target', 'not-monotone',
  'order-off-formal', 'order-not-observed', 'within-target', 'above-target',
] as const;
export type ReasonCode = (typeof reasonCodes)[number];

export interface Position { x: number; y?: number; z?: number }

/** Parts of the domain; only the whole has an outcome. */
export const regions = ['all', 'interior-2h', 'boundary-2h', 'interior-fixed', 'boundary-fixed'] as const;
export type Region = (typeof regions)[number];

export interface ErrorSeries {
  field: string;
  norm: SeriesNorm;
  /** The whole domain where it is left out. */
  region?: Region;
  /** Where there is no exact solution: every error is the norm of the difference to the next coarser grid, the last one to this. */
  comparedTo?: { label: string; h: number };
  /** `exactNorm` is the same norm of the exact field, null where unknown; `knownError` is δ in the unit of the error. */
  grids: { label: string; h: number; error: number; knownError: number; exactNorm: number | null; at: Position | null }[];
  formalOrder: number | null;
  /** λ of a solution u ~ r^λ, which may limit the formal order (regularOrder). */
  regularity?: number | null;
  /** k of an error C·h^p·|ln(h/L)|^k: the order judged is that of the error without its logarithm. */
  logFactor?: { power: number; length: number } | null;
  /** A higher order derived and declared; replaces the formal order in every step. */
  derivedOrder: number | null;
  /** Null takes the default: max(0.1, 0.05·pf), for L∞ max(0.2, 0.1·pf). */
  tolerance: number | null;
  counts: boolean;
  expectExact: boolean;
  exactLimit: number | null;
  /** The larger of the exact field's L∞ and a stated reference; null where neither is known (read as 1). */
  scale: number | null;
  precision: 'double' | 'single';
  minimumGrids: number;
  /** False where a formal order of 3 or more is claimed and nobody said where values live. */
  samplingStated: boolean;
  /** Finite elements: their degree and the order it promises in this norm; `atQuadrature` is false where values should be at quadrature points and are not said to be. */
  elements?: { degree: number; order: number; atQuadrature: boolean };
  /** The pairs of grids that are not refined alike, which no pass stands on. */
  dissimilar?: readonly PairSimilarity[];
}

export const procedures = ['three-grid', 'guarded-order', 'least-squares', 'correction-factor'] as const;
export type Procedure = (typeof procedures)[number];
/** Which way a procedure went; `none` where it gives no uncertainty. */
export const procedureBranches = [
  'observed', 'formal-two-grids', 'near-formal', 'off-formal', 'order-undefined', 'power', 'first-term', 'second-term', 'two-terms',
  'near-asymptotic', 'far-from-asymptotic', 'none',
] as const;
export type ProcedureBranch = (typeof procedureBranches)[number];

export interface QuantitySeries {
  name: string;
  unit: string | null;
  /** `resolution` is one unit of the last digit stated, null where it is to be read off the value; the errors of iteration and time step are in the quantity's unit. */
  grids: { label: string; h: number; value: number; resolution: number | null; iterativeError?: number; timeError?: number }[];
  procedure: Procedure;
  /** What the band of about 95 % is divided by to give u_num; null where it is not stated. */
  uNumFactor: number | null;
  formalOrder: number | null;
  /** Largest acceptable GCI as a fraction. */
  target: number | null;
  minimumGrids: number;
  dissimilar?: readonly PairSimilarity[];
}

export interface FieldGrid {
  label: string; h: number; error: number; relativeError: number | null; knownError: number;
  used: boolean; unusedReason?: 'round-off' | 'known-error'; at?: Position;
  /** The error divided by its logarithm, which is what the orders are read from. */
  correctedError?: number;
}
export interface PairOrder { coarse: string; fine: string; ratio: number; order: number | null; uncertainty: number | null }
export interface OrderFit { order: number; low: number | null; high: number | null }

export interface FieldAssessment {
  field: string; norm: SeriesNorm; region: Region;
  /** The formal order judged by: the stated one, or what the regularity leaves of it. */
  formalOrder: number | null;
  /** Only where the regularity limits it. */
  statedOrder?: number; regularity?: number;
  logFactor?: number;
  /** Where finite elements are stated: their degree and the order it promises in this norm. */
  elements?: { degree: number; order: number };
  derivedOrder: number | null; tolerance: number | null; counts: boolean;
  /** Where errors are norms of the difference to the next coarser grid: the coarsest of all, which has no row of its own. */
  comparedTo?: { label: string; h: number };
  grids: FieldGrid[]; orders: PairOrder[]; fit: OrderFit | null;
  /** Null where there is no formal order to judge by. */
  outcome: Outcome | null; reasons: ReasonCode[];
  /** Only with the reason `not-similar`. */
  dissimilar?: PairSimilarity[];
}

export type Convergence = 'monotone' | 'oscillatory' | 'divergent' | 'oscillatory-divergent' | 'unchanged';
/** `grids` are labels, finest first. */
export interface Triple { grids: string[]; order: number | null; convergence: Convergence }

/** Values fitted over all grids: φ0 + Σ α·h^order. `uncertainty` is U of each grid, finest first. */
export interface ValueFit {
  kind: 'power' | 'first-term' | 'second-term' | 'two-terms';
  /** Whether grid i counts by (1/h_i)/Σ(1/h_j). */
  weighted: boolean;
  value0: number; alpha: number[];
  /** Null for the two terms, which have the orders 1 and 2. */
  order: number | null;
  sigma: number; dataRange: number; uncertainty: number[];
  /** The bound of the search that the fit of an order ended at. */
  atBound: 'lowest' | 'highest' | null;
}

export interface QuantityAssessment {
  name: string; unit: string | null;
  /** As declared: what the orders and the GCI are judged by. */
  formalOrder: number | null; target: number | null;
  values: { label: string; h: number; value: number }[];
  convergence: Convergence | null;
  orderObserved: number | null; orderRange: [number, number] | null; formulaValue: number | null; orderUsed: number | null;
  extrapolated: number | null; relativeChange: number | null; extrapolatedError: number | null;
  safetyFactor: number | null; gci: number | null; gciAbsolute: number | null; gciCoarse: number | null; asymptoticRatio: number | null;
  /** Half the range of the three values, given instead of a GCI where the order is not positive or the values oscillate. */
  halfRange: number | null;
  procedure: Procedure; branch: ProcedureBranch;
  /** Constants of the procedure as used, by name. Members from here to uNum are absent from assessments made before they were kept. */
  constants?: Record<string, number>;
  fit?: ValueFit | null;
  /** U of the finest grid in the quantity's unit and as a fraction, where the procedure gives one instead of a GCI. */
  uncertainty?: number | null; uncertaintyFraction?: number | null;
  uNum?: number | null;
  triples: Triple[];
  outcome: Outcome | null; reasons: ReasonCode[];
  /** Only with the reason `not-similar`. */
  dissimilar?: PairSimilarity[];
}

/** Errors over a matrix of grids and time steps; of a value with a known one they keep their sign. */
export interface SpaceTimeSeries {
  field: string; norm: SeriesNorm; isSigned: boolean;
  formalOrder: number | null;
  points: { label: string; h: number; dt: number; error: number }[];
}

/** E² = A²h^2p + 2ρAB·h^pΔt^q + B²Δt^2q, or E = Ah^p + BΔt^q with a sign; null members where there is no fit. */
export interface SpaceTimeAssessment {
  field: string; norm: SeriesNorm; formalOrder: number | null;
  A: number | null; p: number | null; B: number | null; q: number | null; rho: number | null; residual: number | null;
  spread: { A: number; p: number; B: number; q: number; rho: number | null } | null;
  /** The parts Ah^p and BΔt^q on every grid, null without a fit. */
  points: { label: string; h: number; dt: number; error: number; space: number | null; time: number | null }[];
}

export const patternCodes = [
  'one-field-flat', 'all-flat', 'datum', 'boundary-closure', 'shock', 'contact', 'limiter', 'first-order', 'falling-order', 'stuck-at-two', 'corner', 'alternating',
] as const;
export type PatternCode = (typeof patternCodes)[number];

/** A hint, never an outcome: what the orders look like, with the figures that say so. */
export interface Pattern { code: PatternCode; field?: string; norm?: SeriesNorm; evidence: Record<string, number> }

export interface SeriesAssessment {
  outcome: Outcome | null; reasons: ReasonCode[];
  fields: FieldAssessment[]; quantities: QuantityAssessment[];
  /** Of a study refined in space and time together, which has no outcome. */
  spaceTime?: SpaceTimeAssessment[];
  /** How alike the two finest pairs of grids are refined, where that is known. */
  similarity?: Similarity;
  /** Hints, never an outcome. */
  patterns: Pattern[];
  numericsVersion: string;
}
