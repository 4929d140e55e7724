import { decadeTicks } from '../decade-ticks';
import { linearMap } from '../linear-map';
import { normRuns } from '../norm-runs';
import { pixel } from '../pixel';
import type { PanelDrawing, SceneItem, TextRun } from '../scene';
import { seriesLook, seriesPoint } from '../series-point';
import { spreadLabels } from '../spread-labels';
import { isDrawn, type FigureField } from './figure-fields';
import { formalLine } from './formal-line';
import type { ErrorFigureLayout } from './layout';
import type { ErrorFigureScales } from './scales';
import { slopeTriangle } from './slope-triangle';
import { axesAndSpacingTicks, gridLines, gridNames } from './spacing-axis';

interface PanelPlace { layout: ErrorFigureLayout; scales: ErrorFigureScales; /** The first column carries the names of the error axis. */ isFirst: boolean }
type Map1 = (value: number) => number;

const labelGap = 17;

function errorAxis(scales: ErrorFigureScales, y: Map1, left: number, right: number, isNamed: boolean): SceneItem[] {
  return decadeTicks(scales.error.from, scales.error.to).flatMap(({ log, digit, decade }): SceneItem[] => {
    const at = pixel(y(log));
    if (digit !== 1) return [{ kind: 'path', path: `M${left} ${at}h${digit === 5 ? 5 : 3}`, stroke: 'rule', width: 1 }];
    const name: TextRun[] = [{ text: '10', face: 'sans' }, { text: String(decade).replace('-', '−'), face: 'exponent' }];
    const line: SceneItem = { kind: 'path', path: `M${left} ${at}H${right}`, stroke: 'hairline', width: 1 };
    return isNamed ? [line, { kind: 'text', x: left - 8, y: at + 4, anchor: 'end', runs: name, ink: 'graphite' }] : [line];
  });
}

function triangle(field: FigureField, x: Map1, y: Map1, box: PanelDrawing['box']): SceneItem[] {
  const shape = slopeTriangle(field);
  if (!shape) return [];
  const [left, right, foot] = [x(shape.from), x(shape.to), y(shape.base)];
  // Errors far off their formal order leave the formal line outside the panel, and no room for the triangle under it.
  const top = y(Math.max(...shape.slopes.map((slope) => slope.top)));
  if (top < box.top || foot > box.top + box.height) return [];
  const paths = [...shape.slopes].reverse().map(({ top }): SceneItem => ({
    kind: 'path', path: `M${left} ${foot}H${right}V${y(top)}z`, fill: 'band', stroke: 'graphite', width: 1,
  }));
  const names = shape.slopes.map(({ order, top }, place): SceneItem => {
    const below = shape.slopes[place - 1]?.top ?? shape.base;
    return { kind: 'text', x: right + 6, y: y((top + below) / 2) + 4, anchor: 'start', runs: [{ text: String(order), face: 'sans' }], ink: 'graphite' };
  });
  return [...paths, ...names, { kind: 'text', x: (left + right) / 2, y: foot + 15, anchor: 'middle', runs: [{ text: '1', face: 'sans' }], ink: 'graphite' }];
}

/** The errors of one field against spacing. */
export function errorPanel(field: FigureField, { layout, scales, isFirst }: PanelPlace): PanelDrawing {
  const { metrics, panelWidth, errorHeight } = layout;
  const box = { left: isFirst ? metrics.left : metrics.gap, top: metrics.top, width: panelWidth, height: errorHeight };
  const right = box.left + box.width;
  const x = linearMap(scales.spacing.from, scales.spacing.to, box.left, right);
  const y = linearMap(scales.error.from, scales.error.to, box.top + box.height, box.top);
  const logs = field.grids.map(({ h }) => Math.log10(h));

  const slopes = field.norms.flatMap((series): SceneItem[] => {
    const line = formalLine(series);
    if (!line) return [];
    const [from, to] = [Math.min(...logs) + Math.log10(0.8), Math.max(...logs)];
    return [{
      kind: 'path', path: `M${x(from)} ${y(line.at(from))}L${x(to)} ${y(line.at(to))}`,
      stroke: 'graphite', width: 1, dash: [5, 4], clip: box,
    }];
  });
  const points = field.norms.flatMap(({ norm, grids }) =>
    grids.filter(isDrawn).flatMap(({ h, error, used }) => seriesPoint(norm, x(Math.log10(h)), y(Math.log10(error)), !used)));

  const ends = field.norms.flatMap(({ norm, grids }) => {
    const end = grids.filter(isDrawn).at(-1);
    return end ? [{ norm, x: x(Math.log10(end.h)) + 13, y: y(Math.log10(end.error)) }] : [];
  });
  const heights = spreadLabels(ends.map((end) => end.y), labelGap, box.top + 6, box.top + box.height - 6);
  const labels = ends.map((end, place): SceneItem => ({
    kind: 'text', x: end.x, y: (heights[place] ?? end.y) + 4, anchor: 'start', runs: normRuns([end.norm]), ink: 'ink',
  }));
  const title: SceneItem = {
    kind: 'text', x: box.left, y: 14, anchor: 'start', ink: 'ink',
    runs: [{ text: 'Error of ', face: 'title' }, { text: field.field, face: 'symbol' }],
  };
  return {
    width: right, height: box.top + box.height + 8, box,
    x: { ...scales.spacing, isLog: true }, y: { ...scales.error, isLog: true },
    at: field.grids.map(({ h }) => h),
    lines: field.norms.map(({ norm, grids }) => ({
      ink: seriesLook(norm).ink,
      values: field.grids.map(({ label }) => grids.find((grid) => grid.label === label && grid.used && isDrawn(grid))?.error ?? null),
    })),
    under: [
      title, ...gridNames(field.grids, x, box), ...errorAxis(scales, y, box.left, right, isFirst), ...gridLines(field.grids, x, box),
      ...triangle(field, x, y, box), ...axesAndSpacingTicks(scales.spacing, x, box), ...slopes,
    ],
    over: [...points, ...labels],
  };
}
