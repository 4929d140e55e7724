import { linearMap } from '../linear-map';
import { normRuns } from '../norm-runs';
import { pixel } from '../pixel';
import type { PanelDrawing, SceneItem, TextRun } from '../scene';
import { seriesLook, seriesPoint } from '../series-point';
import type { FigureField } from './figure-fields';
import type { ErrorFigureLayout } from './layout';
import { orderBands } from './order-bands';
import { pairPoints } from './pair-points';
import type { ErrorFigureScales } from './scales';
import { axesAndSpacingTicks, gridLines, spacingNames } from './spacing-axis';

interface PanelPlace { layout: ErrorFigureLayout; scales: ErrorFigureScales; isFirst: boolean }
type Map1 = (value: number) => number;

const smallestBar = 0.02;

/** Ticks at halves, at whole numbers or fives where the panel spans more. */
export function orderTicks(from: number, to: number): number[] {
  const step = to - from > 14 ? 5 : to - from > 6 ? 2 : to - from > 3.2 ? 1 : 0.5;
  const first = Math.ceil(from / step);
  return Array.from({ length: Math.floor(to / step) - first + 1 }, (_, index) => (first + index) * step);
}

function bands(field: FigureField, y: Map1, left: number, right: number, clip: PanelDrawing['box']): SceneItem[] {
  const all = orderBands(field);
  const fills = all.map(({ low, high, ink }): SceneItem => ({
    kind: 'path', path: `M${left} ${y(high)}H${right}V${y(low)}H${left}z`, fill: ink, clip,
  }));
  const names = all.map(({ norms, formal, low, ink }): SceneItem => {
    const isOuter = ink === 'band2';
    const runs: TextRun[] = isOuter ? [{ text: 'band of ', face: 'sans' }, ...normRuns(norms)] : normRuns(norms);
    return { kind: 'text', x: right - 5, y: isOuter ? y(low) + 15 : y(formal) - 6, anchor: 'end', runs, ink: 'graphite' };
  });
  return [...fills, ...names];
}

function errorBar(x: number, y: Map1, order: number, uncertainty: number, clip: PanelDrawing['box']): SceneItem {
  const [top, foot] = [y(order + uncertainty), y(order - uncertainty)];
  return { kind: 'path', path: `M${x} ${top}V${foot}M${x - 3} ${top}h6M${x - 3} ${foot}h6`, stroke: 'ink', width: 1, clip };
}

/** The observed orders of one field below its errors, on the same spacing axis. */
export function orderPanel(field: FigureField, { layout, scales, isFirst }: PanelPlace): PanelDrawing {
  const { metrics, panelWidth, isNarrow } = layout;
  const box = { left: isFirst ? metrics.left : metrics.gap, top: metrics.between - 8, width: panelWidth, height: metrics.order };
  const right = box.left + box.width;
  const x = linearMap(scales.spacing.from, scales.spacing.to, box.left, right);
  const y = linearMap(scales.order.from, scales.order.to, box.top + box.height, box.top);
  const series = field.norms.map((each) => ({ norm: each.norm, points: pairPoints(each) }));
  const at = [...new Set(series.flatMap(({ points }) => points.map(({ h }) => h)))].sort((a, b) => a - b);
  const formal = [...new Set(field.norms.map((each) => each.derivedOrder ?? each.formalOrder).filter((order) => order !== null))];

  const ticks = orderTicks(scales.order.from, scales.order.to).flatMap((order): SceneItem[] => {
    const place = pixel(y(order));
    const tick: SceneItem = { kind: 'path', path: `M${box.left} ${place}h3`, stroke: 'rule', width: 1 };
    const name: TextRun[] = [{ text: order.toFixed(1).replace('-', '−'), face: 'sans' }];
    return isFirst ? [tick, { kind: 'text', x: box.left - 8, y: place + 4, anchor: 'end', runs: name, ink: 'graphite' }] : [tick];
  });
  const inRange = ({ order }: { order: number }) => order >= scales.order.from && order <= scales.order.to;
  const drawn = series.flatMap(({ norm, points }) => points.filter(inRange).flatMap((point): SceneItem[] => {
    const place = x(Math.log10(point.h));
    const bar = point.uncertainty !== null && point.uncertainty > smallestBar ? [errorBar(place, y, point.order, point.uncertainty, box)] : [];
    return [...bar, ...seriesPoint(norm, place, y(point.order), !point.isUsed)];
  }));
  return {
    width: right, height: box.top + box.height + metrics.foot, box,
    x: { ...scales.spacing, isLog: true }, y: { ...scales.order, isLog: false },
    at,
    lines: series.map(({ norm, points }) => ({
      ink: seriesLook(norm).ink,
      values: at.map((h) => points.find((point) => point.h === h && point.isUsed && inRange(point))?.order ?? null),
    })),
    under: [
      { kind: 'text', x: box.left, y: box.top - 10, anchor: 'start', runs: [{ text: 'Observed order', face: 'title' }], ink: 'ink' },
      ...bands(field, y, box.left, right, box), ...gridLines(field.grids, x, box), ...ticks,
      ...formal.map((order): SceneItem => ({ kind: 'path', path: `M${box.left} ${pixel(y(order))}H${right}`, stroke: 'graphite', width: 1, dash: [5, 4], clip: box })),
      ...axesAndSpacingTicks(scales.spacing, x, box), ...spacingNames(scales.spacing, x, box, isNarrow),
    ],
    over: drawn,
  };
}
