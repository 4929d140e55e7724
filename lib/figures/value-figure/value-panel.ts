import type { QuantityAssessment } from '../../numerics/assessment';
import { axisNumber } from '../axis-number';
import { linearMap } from '../linear-map';
import { pixel } from '../pixel';
import { roundTicks } from '../round-ticks';
import type { PanelDrawing, SceneItem } from '../scene';
import { diamond, seriesPoint } from '../series-point';
import { spacingLabel } from '../spacing-label';
import { extrapolationCurve } from './extrapolation-curve';
import { uncertaintyBars } from './uncertainty-bars';

const metrics = { left: 62, right: 8, top: 30, foot: 46 };
const nameRoom = 40;
const curveSteps = 60;
const roomAtEnds = 0.08;
const roomForName = 0.2;

/** Height of the panel in pixels for a width: a little over half, within what reads well. */
function valuePanelHeight(width: number): number {
  return metrics.top + metrics.foot + Math.round(Math.min(300, Math.max(170, (width - metrics.left - metrics.right) * 0.52)));
}

/** The same height as a CSS length of a size container, to keep free before the width is known. */
export const valueRoom = `calc(${metrics.top + metrics.foot}px + clamp(170px, (100cqw - ${metrics.left + metrics.right}px) * 0.52, 300px))`;

function valueRange(values: readonly number[], nameSide: 'below' | 'above' | null): { from: number; to: number } {
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const span = high > low ? high - low : Math.max(Math.abs(high) * 0.5, 1e-12);
  return { from: low - span * (nameSide === 'below' ? roomForName : roomAtEnds), to: high + span * (nameSide === 'above' ? roomForName : roomAtEnds) };
}

/** A quantity against spacing, linear from h = 0, with its extrapolated value, the index as bars and the curve between. */
export function valuePanel(quantity: QuantityAssessment, width: number): PanelDrawing {
  const { name, unit, values, extrapolated } = quantity;
  const box = { left: metrics.left, top: metrics.top, width: width - metrics.left - metrics.right, height: valuePanelHeight(width) - metrics.top - metrics.foot };
  const [right, foot] = [box.left + box.width, box.top + box.height];
  const coarsest = Math.max(...values.map(({ h }) => h));
  const curve = extrapolationCurve(quantity);
  const bars = uncertaintyBars(quantity);
  const shown = [...values.map(({ value }) => value), ...bars.flatMap(({ value, half }) => [value - half, value + half])];
  // The name of the extrapolated value stands on the side that the curve turns away from, clear of points and bars.
  const nameSide = extrapolated === null ? null : (values[0]?.value ?? extrapolated) >= extrapolated ? 'below' : 'above';
  const all = extrapolated === null ? shown : [...shown, extrapolated];
  const range = valueRange(all, nameSide);
  const end = coarsest * 1.1;
  const x = linearMap(0, end, box.left, right);
  const y = linearMap(range.from, range.to, foot, box.top);

  const { values: ticks, decimals } = roundTicks(range.from, range.to, 6);
  const scale = ticks.flatMap((value): SceneItem[] => [
    { kind: 'path', path: `M${box.left} ${pixel(y(value))}H${right}`, stroke: 'hairline', width: 1 },
    { kind: 'text', x: box.left - 8, y: y(value) + 4, anchor: 'end', ink: 'graphite', runs: axisNumber(value, decimals) },
  ]);
  let last = box.left;
  const grids = [...values].sort((a, b) => b.h - a.h);
  const named = [...grids].reverse().flatMap(({ h }): SceneItem[] => {
    const at = x(h);
    const tick: SceneItem = { kind: 'path', path: `M${pixel(at)} ${foot}v3`, stroke: 'rule', width: 1 };
    if (at - last < nameRoom) return [tick];
    last = at;
    return [tick, { kind: 'text', x: at, y: foot + 18, anchor: 'middle', ink: 'graphite', runs: [{ text: spacingLabel(h), face: 'sans' }] }];
  });
  const path = curve
    ? Array.from({ length: curveSteps + 1 }, (_, step) => (end * 0.97 * step) / curveSteps)
      .map((h, step) => `${step === 0 ? 'M' : 'L'}${x(h).toFixed(2)} ${y(curve(h)).toFixed(2)}`).join('')
    : null;
  const limit: SceneItem[] = extrapolated === null ? [] : [
    { kind: 'path', path: diamond, at: [x(0), y(extrapolated)], stroke: 'paper', width: 4 },
    { kind: 'path', path: diamond, at: [x(0), y(extrapolated)], fill: 'paper', stroke: 'ink', width: 1.5 },
    {
      kind: 'text', x: x(0) + 12, y: nameSide === 'below' ? Math.max(y(extrapolated) + 19, y(Math.min(...all)) + 16) : Math.min(y(extrapolated) - 11, y(Math.max(...all)) - 8), anchor: 'start', ink: 'ink',
      runs: [{ text: 'extrapolated ', face: 'sans' }, ...axisNumber(extrapolated, decimals + 1)],
    },
  ];
  return {
    width, height: foot + metrics.foot, box,
    x: { from: 0, to: end, isLog: false }, y: { ...range, isLog: false },
    at: [...grids].reverse().map(({ h }) => h),
    lines: [],
    under: [
      { kind: 'text', x: box.left, y: 14, anchor: 'start', ink: 'ink', runs: [{ text: unit ? `${name}, ${unit}` : name, face: 'title' }] },
      ...scale, ...named,
      { kind: 'text', x: x(0), y: foot + 18, anchor: 'middle', ink: 'graphite', runs: [{ text: '0', face: 'sans' }] },
      { kind: 'text', x: right, y: foot + 38, anchor: 'end', ink: 'graphite', runs: [{ text: 'spacing ', face: 'sans' }, { text: 'h', face: 'symbol' }] },
      { kind: 'path', path: `M${pixel(box.left)} ${box.top}V${pixel(foot)}H${right}`, stroke: 'rule', width: 1 },
      ...(path === null ? [] : [{ kind: 'path', path, stroke: 'graphite', width: 1, dash: [5, 4], clip: box } satisfies SceneItem]),
    ],
    over: [
      ...bars.map(({ h, value, half }): SceneItem => {
        const [at, top, bottom] = [pixel(x(h)), y(value + half), y(value - half)];
        return { kind: 'path', path: `M${at} ${top}V${bottom}M${at - 5} ${top}h10M${at - 5} ${bottom}h10`, stroke: 'ink', width: 1.25 };
      }),
      ...grids.flatMap(({ h, value }) => seriesPoint('value', x(h), y(value), false)),
      ...limit,
    ],
  };
}
