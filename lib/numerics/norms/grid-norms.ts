import type { Position, Region } from '../assessment';
import type { RigidMotion } from '../rigid/rigid-motion';
import type { MeshSurvey } from '../mesh/mesh-part';

/** Norms of one field on one grid: e is the value of the file minus the exact one, each norm divided by the sum of weights. */
export interface FieldNorms {
  field: string;
  L1: number;
  L2: number;
  Linf: number;
  /** Where the largest error lies, the first such row of the file. */
  at: Position;
  /** Weighted mean of e with its sign. */
  mean: number;
  exact: { L1: number; L2: number; Linf: number };
  min: number;
  max: number;
  maxAbs: number;
  count: number;
  /** Most significant digits seen in the column, null where the source does not print digits. */
  significantDigits: number | null;
  /** Where the source stores the column as float32; absent where it does not, or does not say. */
  storedAs?: 'single';
  /** What was taken out of the field before its norms: the constant of q − q_exact, the factor q was multiplied by, or its component of the rigid motion at the centre. */
  datum?: { kind: 'mean' | 'scale' | 'rigid'; value: number };
}

/** The H1 seminorm of the error, √(Σw|∇q − ∇q_exact|²/Σw), from columns of the gradient. */
export interface GradientNorms { field: string; H1: number; exactH1: number; maxAbs: number; significantDigits: number | null; storedAs?: 'single' }

/** Of a field without an exact solution: norms of the field itself. */
export type SolutionNorms = Pick<FieldNorms, 'field' | 'L1' | 'L2' | 'Linf' | 'min' | 'max' | 'maxAbs' | 'count' | 'significantDigits'>;

export interface GridNorms {
  rows: number;
  /** Rows beside these that the file marks as counted elsewhere, as pieces of a grid have cells of their neighbours; absent for none. */
  rowsLeftOut?: number;
  weightSum: number;
  equalWeights: boolean;
  fields: FieldNorms[];
  gradients?: GradientNorms[];
  /** Where the problem has no exact solution; `fields` is empty then. */
  solutions?: SolutionNorms[];
  /** The same of parts of the domain, each divided by its own sum of weights; a part without rows is left out. */
  regions?: RegionNorms[];
  /** Absent where it was not asked for, or read before it was kept. */
  mesh?: MeshSurvey;
  /** The rigid motion taken out of the fields that are free by one. */
  motion?: RigidMotion;
}

export interface RegionNorms extends Omit<GridNorms, 'regions' | 'mesh' | 'motion'> { region: Region }
