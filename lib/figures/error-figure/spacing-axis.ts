import { decadeTicks } from '../decade-ticks';
import { pixel } from '../pixel';
import { spacingLabel } from '../spacing-label';
import type { Box, SceneItem } from '../scene';

const labelRoom = 40;

/** A hairline through the panel at each grid. */
export function gridLines(grids: readonly { h: number }[], x: (log: number) => number, box: Box): SceneItem[] {
  return grids.map(({ h }) => ({
    kind: 'path', path: `M${pixel(x(Math.log10(h)))} ${box.top}V${box.top + box.height}`, stroke: 'hairline', width: 1,
  }));
}

/** The grids' own names above the panel; where two would touch the finer one stays. */
export function gridNames(grids: readonly { h: number }[], x: (log: number) => number, box: Box): SceneItem[] {
  let last = -Infinity;
  return [...grids].sort((a, b) => a.h - b.h).flatMap(({ h }): SceneItem[] => {
    const at = x(Math.log10(h));
    if (at - last < labelRoom) return [];
    last = at;
    return [{ kind: 'text', x: at, y: box.top - 9, anchor: 'middle', runs: [{ text: spacingLabel(h), face: 'sans' }], ink: 'graphite' }];
  });
}

/** Left and bottom axis with the ticks of the spacing outside, decades longer. */
export function axesAndSpacingTicks(range: { from: number; to: number }, x: (log: number) => number, box: Box): SceneItem[] {
  const [left, foot] = [pixel(box.left), pixel(box.top + box.height)];
  const ticks = decadeTicks(range.from, range.to).map(({ log, digit }) => `M${pixel(x(log))} ${foot}v${digit === 1 ? 6 : 3}`);
  return [
    { kind: 'path', path: `M${left} ${box.top}V${foot}H${box.left + box.width}`, stroke: 'rule', width: 1 },
    { kind: 'path', path: ticks.join(''), stroke: 'rule', width: 1 },
  ];
}

/** Powers of ten under the lower panel, and the name of the axis at its right end. */
export function spacingNames(range: { from: number; to: number }, x: (log: number) => number, box: Box, nameOnOwnLine: boolean): SceneItem[] {
  const foot = box.top + box.height;
  const right = box.left + box.width;
  const decades = decadeTicks(range.from, range.to).filter(({ digit }) => digit === 1);
  const names = decades.filter(({ log }) => nameOnOwnLine || x(log) < right - 78).map(({ log, decade }): SceneItem => ({
    kind: 'text', x: x(log), y: foot + 20, anchor: 'middle', ink: 'graphite',
    runs: [{ text: '10', face: 'sans' }, { text: String(decade).replace('-', '−'), face: 'exponent' }],
  }));
  return [...names, {
    kind: 'text', x: right, y: foot + (nameOnOwnLine ? 40 : 20), anchor: 'end', ink: 'graphite',
    runs: [{ text: 'spacing ', face: 'sans' }, { text: 'h', face: 'symbol' }],
  }];
}
