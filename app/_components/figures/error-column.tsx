'use client';

import { useMemo } from 'react';
import { errorPanel } from '@/lib/figures/error-figure/error-panel';
import type { FigureField } from '@/lib/figures/error-figure/figure-fields';
import type { ErrorFigureLayout } from '@/lib/figures/error-figure/layout';
import { orderPanel } from '@/lib/figures/error-figure/order-panel';
import type { ErrorFigureScales } from '@/lib/figures/error-figure/scales';
import { linearMap } from '@/lib/figures/linear-map';
import { PlotCanvas } from './plot-canvas';

interface ErrorColumnProps {
  field: FigureField;
  layout: ErrorFigureLayout;
  scales: ErrorFigureScales;
  isFirst: boolean;
  readH: number;
  onPoint: (h: number) => void;
}

/** Errors and, below them, observed orders of one field, with the line of the read-out through both. */
export function ErrorColumn({ field, layout, scales, isFirst, readH, onPoint }: ErrorColumnProps) {
  const errors = useMemo(() => errorPanel(field, { layout, scales, isFirst }), [field, layout, scales, isFirst]);
  const orders = useMemo(() => orderPanel(field, { layout, scales, isFirst }), [field, layout, scales, isFirst]);
  const { box } = errors;
  const left = linearMap(scales.spacing.from, scales.spacing.to, box.left, box.left + box.width)(Math.log10(readH));
  return (
    <div className="relative">
      <PlotCanvas drawing={errors} onPoint={onPoint} />
      <PlotCanvas drawing={orders} onPoint={onPoint} />
      {[{ top: box.top, height: box.height }, { top: errors.height + orders.box.top, height: orders.box.height }].map((span) => (
        <div
          key={span.top}
          aria-hidden
          className="pointer-events-none absolute w-px bg-graphite opacity-60 print:hidden"
          style={{ left: Math.floor(left), ...span }}
        />
      ))}
    </div>
  );
}
