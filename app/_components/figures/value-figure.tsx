'use client';

import { useId, useMemo, useRef, useState, type ReactNode } from 'react';
import { formatValue } from '@/lib/domain/numbers/format-value';
import { spacingLabel } from '@/lib/figures/spacing-label';
import { uncertaintyBars } from '@/lib/figures/value-figure/uncertainty-bars';
import { valuePanel, valueRoom } from '@/lib/figures/value-figure/value-panel';
import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { FormulaText } from '../ui/formula-text';
import { FigureCaption } from './figure-caption';
import { FigureStage } from './figure-stage';
import { PlotCanvas } from './plot-canvas';
import { useWidth } from './use-width';
import { ValueNumbers } from './value-numbers';

interface ValueFigureProps {
  quantity: QuantityAssessment;
  number?: number;
  caption?: ReactNode;
}

function usualCaption(quantity: QuantityAssessment): string {
  const bars = quantity.uncertainty ? '; bars are U in the quantity’s unit' : quantity.gciAbsolute !== null ? '; bars are the index in the quantity’s unit' : quantity.halfRange !== null ? '; the bar is half the range' : '';
  const curve = quantity.extrapolated !== null ? '; dashed, the extrapolation' : '';
  return `Value against spacing${bars}${curve}.`;
}

/** A quantity without an exact value: its values against spacing, linear from zero, and where they tend. */
export function ValueFigure({ quantity, number = 1, caption = usualCaption(quantity) }: ValueFigureProps) {
  const stageRef = useRef<HTMLDivElement>(null);
  const width = useWidth(stageRef);
  const numbersId = useId();
  const [areNumbersShown, setAreNumbersShown] = useState(false);
  const [place, setPlace] = useState(0);
  const drawing = useMemo(() => (width && quantity.values.length > 0 ? valuePanel(quantity, width) : null), [quantity, width]);
  const { values } = quantity;
  const read = values[Math.min(place, values.length - 1)];
  if (!read) return <p className="text-graphite">No values to draw.</p>;

  const half = uncertaintyBars(quantity).find(({ h }) => h === read.h)?.half ?? null;
  const words = `Grid ${read.label}, h ${spacingLabel(read.h)}: ${formatValue(read.value, half)}${half === null ? '' : ` ± ${formatValue(half, half)}`}${quantity.unit ? ` ${quantity.unit}` : ''}`;
  const readNearest = (h: number) => {
    const far = (at: number) => Math.abs((values[at]?.h ?? Infinity) - h);
    setPlace(values.reduce((best, _, at) => (far(at) < far(best) ? at : best), 0));
  };
  return (
    <figure className="figure-block">
      <FigureStage
        ref={stageRef}
        name={`Figure ${number}, grid read out`}
        place={Math.min(place, values.length - 1)}
        count={values.length}
        words={words}
        onMove={setPlace}
        room={{ narrow: valueRoom, wide: valueRoom }}
      >
        {drawing && <PlotCanvas drawing={drawing} onPoint={readNearest} />}
      </FigureStage>
      <FigureCaption
        number={number}
        numbersId={numbersId}
        areNumbersShown={areNumbersShown}
        onToggleNumbers={() => setAreNumbersShown(!areNumbersShown)}
      >
        {caption}
      </FigureCaption>
      <p className="mt-1 min-h-5 text-note text-graphite"><FormulaText text={words} symbols={['h']} /></p>
      <div id={numbersId} hidden={!areNumbersShown}>{areNumbersShown && <ValueNumbers number={number} quantity={quantity} />}</div>
    </figure>
  );
}
