/** What is known about the spacing of one grid. Σ weights and rows come from its file. */
export interface KnownSpacing {
  label: string;
  h?: number;
  /** All cells of the grid. */
  cells?: number;
  cellsPerDirection?: number;
  weightSum?: number;
  rows?: number;
  /** Time step, the spacing of a study refined in time. */
  dt?: number;
}

/** The same as it comes from forms and tables, where null means not stated. */
export type StatedSpacing = { label: string } & { [Key in Exclude<keyof KnownSpacing, 'label'>]?: number | null };

export type SpacingBasis = 'h' | 'cells' | 'cells-per-direction' | 'weights' | 'time-step';

/** `index` is the place of the grid in the request. */
export interface ResolvedSpacing { label: string; h: number; basis: SpacingBasis; index: number }

/** Why no spacing is given; `label` is the grid concerned, null where it is the series. */
export interface SpacingProblem {
  code: 'spacing-missing' | 'not-positive' | 'dimension-missing' | 'mixed-bases' | 'same-spacing' | 'order-contradicts';
  label: string | null;
  found: string;
  expected: string;
}

/** What wants a look but stops nothing. */
export interface SpacingNote { code: 'rows-differ-from-cells' | 'weights-differ' | 'weights-differ-from-volume'; label: string; found: number; expected: number }
