/** What a figure is made of, in pixels of its own drawing area: a canvas, an SVG or a page can paint it. */

export type Ink =
  | 'paper' | 'ink' | 'graphite' | 'rule' | 'hairline' | 'band' | 'band2' | 's1' | 's2' | 'si';

export interface Box { left: number; top: number; width: number; height: number }

export interface ScenePath {
  kind: 'path';
  /** SVG path data, moved to `at` where that is given. */
  path: string;
  at?: readonly [number, number];
  fill?: Ink;
  stroke?: Ink;
  width?: number;
  dash?: readonly number[];
  /** Nothing is painted outside this box. */
  clip?: Box;
}

/** `sans` 12.5 px, `title` 13.5 px bold, `symbol` serif italic 15 px, `index` 11 px lowered, `exponent` 9.5 px raised. */
export interface TextRun { text: string; face: 'sans' | 'title' | 'symbol' | 'index' | 'exponent' }

export interface SceneText {
  kind: 'text';
  x: number;
  /** Of the baseline. */
  y: number;
  anchor: 'start' | 'middle' | 'end';
  runs: readonly TextRun[];
  ink: Ink;
}

export type SceneItem = ScenePath | SceneText;

/** One panel with its axes: data joined by lines, and what lies under and over them. */
export interface PanelDrawing {
  width: number;
  height: number;
  /** The area of the axes within the panel. */
  box: Box;
  /** `from` and `to` are log10 of the value where the axis is logarithmic. */
  x: { from: number; to: number; isLog: boolean };
  y: { from: number; to: number; isLog: boolean };
  /** Positions along x, ascending; each line has a value or null at every one. */
  at: readonly number[];
  lines: readonly { ink: Ink; values: readonly (number | null)[] }[];
  under: readonly SceneItem[];
  over: readonly SceneItem[];
}
