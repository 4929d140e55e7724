import { axisNumber } from '../axis-number';
import { linearMap } from '../linear-map';
import { pixel } from '../pixel';
import { roundTicks } from '../round-ticks';
import type { SceneItem, TextRun } from '../scene';
import { seriesLook } from '../series-point';
import type { ErrorRaster } from './error-raster';
import { placeOf, type MapLayout } from './map-layout';
import type { MapScale } from './map-scale';

/** Where the error is largest, and the words that stand beside it. */
export interface MapPeak { at: Partial<Record<'x' | 'y' | 'z', number>>; runs: readonly TextRun[] }

interface MapSubject { raster: ErrorRaster; layout: MapLayout; scale: MapScale | null; field: string; peak: MapPeak | null }

const circle = 'M8.5 0A8.5 8.5 0 1 1-8.5 0A8.5 8.5 0 1 1 8.5 0z';
/** Of the face figures are written in, a little more than it takes. */
const letterWidth: Record<TextRun['face'], number> = { sans: 7, title: 7.6, symbol: 8, index: 6, exponent: 5.6 };
const patch = { height: 22, padding: 7, away: 16 };

/** Axes, scale and the mark of the largest error: all of a map but its bins. */
export function mapScene({ raster, layout, scale, field, peak }: MapSubject): SceneItem[] {
  const { box } = layout;
  return [
    { kind: 'text', x: box.left, y: 16, anchor: 'start', ink: 'ink', runs: [{ text: '|error| of ', face: 'title' }, { text: field, face: 'symbol' }] },
    ...alongAxis(raster, layout),
    ...upAxis(raster, layout),
    { kind: 'path', path: `M${pixel(box.left)} ${pixel(box.top)}h${box.width}v${box.height}h${-box.width}z`, stroke: 'rule', width: 1 },
    ...(scale === null ? [] : scaleBar(layout, scale)),
    ...(peak === null ? [] : peakMark(raster, layout, peak)),
  ];
}

function alongAxis({ along }: ErrorRaster, { box }: MapLayout): SceneItem[] {
  const foot = box.top + box.height;
  const right = box.left + box.width;
  const place = linearMap(along.from, along.to, box.left, right);
  const { values, decimals } = roundTicks(along.from, along.to, Math.max(2, Math.floor(box.width / 75)));
  return [
    ...values.flatMap((value): SceneItem[] => [
      { kind: 'path', path: `M${pixel(place(value))} ${foot}v4`, stroke: 'rule', width: 1 },
      { kind: 'text', x: place(value), y: foot + 18, anchor: 'middle', ink: 'graphite', runs: axisNumber(value, decimals) },
    ]),
    { kind: 'text', x: right, y: foot + 36, anchor: 'end', ink: 'graphite', runs: [{ text: along.name, face: 'symbol' }] },
  ];
}

function upAxis({ up }: ErrorRaster, { box }: MapLayout): SceneItem[] {
  if (up === null) return [];
  const place = linearMap(up.from, up.to, box.top + box.height, box.top);
  const { values, decimals } = roundTicks(up.from, up.to, Math.max(2, Math.floor(box.height / 60)));
  return [
    ...values.flatMap((value): SceneItem[] => [
      { kind: 'path', path: `M${box.left} ${pixel(place(value))}h-4`, stroke: 'rule', width: 1 },
      { kind: 'text', x: box.left - 8, y: place(value) + 4, anchor: 'end', ink: 'graphite', runs: axisNumber(value, decimals) },
    ]),
    { kind: 'text', x: box.left - 8, y: 16, anchor: 'end', ink: 'graphite', runs: [{ text: up.name, face: 'symbol' }] },
  ];
}

function scaleBar({ bar }: MapLayout, { from, to }: MapScale): SceneItem[] {
  const right = bar.left + bar.width;
  const place = linearMap(from, to, bar.top + bar.height, bar.top);
  const decades = Array.from({ length: to - from + 1 }, (_, index) => from + index);
  return [
    { kind: 'path', path: `M${pixel(bar.left)} ${pixel(bar.top)}h${bar.width}v${bar.height}h${-bar.width}z`, stroke: 'rule', width: 1 },
    ...decades.flatMap((decade): SceneItem[] => [
      { kind: 'path', path: `M${right} ${pixel(place(decade))}h4`, stroke: 'rule', width: 1 },
      { kind: 'text', x: right + 8, y: place(decade) + 4, anchor: 'start', ink: 'graphite', runs: [{ text: '10', face: 'sans' }, { text: String(decade).replace('-', '−'), face: 'exponent' }] },
    ]),
  ];
}

/** The cross of L∞ in a circle, with its words on a patch of paper, on the side where there is room. */
function peakMark(raster: ErrorRaster, layout: MapLayout, { at, runs }: MapPeak): SceneItem[] {
  const place = placeOf(raster, layout, at);
  if (place === null) return [];
  const [x, y] = place;
  const { box } = layout;
  const { path, ink } = seriesLook('Linf');
  const wide = runs.reduce((sum, { text, face }) => sum + [...text].length * letterWidth[face], 0) + 2 * patch.padding;
  const isRight = x + patch.away + wide <= box.left + box.width + 4;
  const left = isRight ? x + patch.away : Math.max(2, x - patch.away - wide);
  const fits = isRight || x - patch.away - wide >= 2;
  const beside = Math.min(box.top + box.height - patch.height, Math.max(box.top, y - patch.height / 2));
  const top = fits ? beside : y - box.top > box.height / 2 ? y - patch.away - patch.height : y + patch.away;
  return [
    { kind: 'path', path: circle, at: place, fill: 'paper', stroke: 'paper', width: 4 },
    { kind: 'path', path: circle, at: place, fill: 'paper', stroke: 'ink', width: 1.5 },
    { kind: 'path', path, at: place, fill: ink },
    { kind: 'path', path: `M${left} ${top}h${wide}v${patch.height}h${-wide}z`, fill: 'paper', stroke: 'hairline', width: 1 },
    { kind: 'text', x: left + wide / 2, y: top + 15, anchor: 'middle', ink: 'ink', runs },
  ];
}
