'use client';

import { useEffect, useRef } from 'react';
import uPlot from 'uplot';
import 'uplot/dist/uPlot.min.css';
import type { PanelDrawing } from '@/lib/figures/scene';
import { whenFacesAreThere } from './figure-faces';
import { paintScene, readPalette } from './paint-scene';
import { watchTheme } from './watch-theme';

interface PlotCanvasProps {
  drawing: PanelDrawing;
  /** The pointer is over the axes at this value of x. */
  onPoint?: (x: number) => void;
}

type Axis = PanelDrawing['x'];
const ends = ({ from, to, isLog }: Axis): [number, number] => (isLog ? [10 ** from, 10 ** to] : [from, to]);
const scaleOf = (axis: Axis): uPlot.Scale => ({ time: false, distr: axis.isLog ? 3 : 1, range: () => ends(axis) });

function plotOptions(drawing: PanelDrawing, point: (x: number) => void): uPlot.Options {
  const { width, height, box } = drawing;
  let palette = readPalette();
  return {
    width, height,
    padding: [box.top, width - box.left - box.width, height - box.top - box.height, box.left],
    legend: { show: false },
    axes: [{ show: false }, { show: false }],
    scales: { x: scaleOf(drawing.x), y: scaleOf(drawing.y) },
    series: [{}, ...drawing.lines.map(({ ink }): uPlot.Series => ({
      stroke: () => palette[ink], width: 1.5, spanGaps: true, pxAlign: 0, points: { show: false },
    }))],
    cursor: { x: false, y: false, points: { show: false }, drag: { x: false, y: false, setScale: false } },
    hooks: {
      drawClear: [(plot) => { palette = readPalette(); paintScene(plot.ctx, drawing.under, palette, uPlot.pxRatio); }],
      draw: [(plot) => paintScene(plot.ctx, drawing.over, palette, uPlot.pxRatio)],
      setCursor: [(plot) => {
        const left = plot.cursor.left ?? -1;
        if (left >= 0 && plot.cursor.event) point(plot.posToVal(left, 'x'));
      }],
    },
  };
}

/** One panel on a canvas. Everything it says also stands in the read-out line and in the table of numbers. */
export function PlotCanvas({ drawing, onPoint }: PlotCanvasProps) {
  const hostRef = useRef<HTMLDivElement>(null);
  const pointRef = useRef(onPoint);
  useEffect(() => { pointRef.current = onPoint; }, [onPoint]);

  useEffect(() => {
    const host = hostRef.current;
    if (!host) return undefined;
    const data = [drawing.at, ...drawing.lines.map(({ values }) => values)] as uPlot.AlignedData;
    const plot = new uPlot(plotOptions(drawing, (x) => pointRef.current?.(x)), data, host);
    let isGone = false;
    const redraw = () => { if (!isGone) plot.redraw(false); };
    whenFacesAreThere(redraw);
    const unwatch = watchTheme(redraw);
    return () => {
      isGone = true;
      unwatch();
      plot.destroy();
    };
  }, [drawing]);

  return <div ref={hostRef} aria-hidden style={{ width: drawing.width, height: drawing.height }} />;
}
