'use client';

import { useId, useMemo, useRef, useState, type ReactNode } from 'react';
import type { FieldAssessment } from '@/lib/numerics/assessment';
import { figureFields, type FigureField } from '@/lib/figures/error-figure/figure-fields';
import { errorFigureLayout, errorFigureRoom, mostColumns } from '@/lib/figures/error-figure/layout';
import { errorFigureScales } from '@/lib/figures/error-figure/scales';
import { ErrorColumn } from './error-column';
import { ErrorNumbers } from './error-numbers';
import { ErrorReadOut, readOutWords, type ReadGrid } from './error-read-out';
import { FieldSwitch } from './field-switch';
import { FigureCaption } from './figure-caption';
import { FigureStage } from './figure-stage';
import { PointKey } from './point-key';
import { useWidth } from './use-width';

interface ErrorFigureProps {
  fields: readonly FieldAssessment[];
  number?: number;
  caption?: ReactNode;
}

const usualCaption = 'Errors against spacing, and the observed order of each pair of grids, placed between the two.';

function allGrids(fields: readonly FigureField[]): ReadGrid[] {
  const grids = new Map(fields.flatMap((field) => field.grids.map((grid) => [grid.label, grid] as const)));
  return [...grids.values()].sort((a, b) => a.h - b.h);
}

/** Errors above, observed orders below, a column for each field; where there is room for one column only, a switch. */
export function ErrorFigure({ fields: assessments, number = 1, caption = usualCaption }: ErrorFigureProps) {
  const stageRef = useRef<HTMLDivElement>(null);
  const width = useWidth(stageRef);
  const numbersId = useId();
  const [areNumbersShown, setAreNumbersShown] = useState(false);
  const [shownField, setShownField] = useState<string | null>(null);
  const [readLabel, setReadLabel] = useState<string | null>(null);
  const fields = useMemo(() => figureFields(assessments), [assessments]);
  const scales = useMemo(() => errorFigureScales(fields), [fields]);
  const layout = useMemo(
    () => (scales && width ? errorFigureLayout(width, fields.length, scales.ratio) : null), [scales, width, fields.length],
  );
  const grids = useMemo(() => allGrids(fields), [fields]);
  const shown = fields.find(({ field }) => field === shownField) ?? fields[0];
  const place = Math.max(0, grids.findIndex(({ label }) => label === readLabel));
  const grid = grids[place];
  if (!scales || !shown || !grid) return <p className="text-graphite">No error above zero to draw.</p>;

  const columns = layout?.columns === 1 ? [shown] : fields.slice(0, mostColumns);
  const readNearest = (h: number) => {
    const far = (each: ReadGrid) => Math.abs(Math.log(each.h / h));
    setReadLabel(grids.reduce((best, each) => (far(each) < far(best) ? each : best)).label);
  };
  const norms = [...new Set(fields.flatMap((field) => field.norms.map(({ norm }) => norm)))];
  return (
    <figure className="figure-block">
      {fields.length > 1 && (
        <div className="figure-stage">
          <FieldSwitch fields={fields.map(({ field }) => field)} shown={shown.field} onShow={setShownField} onlyNarrow={fields.length <= mostColumns} />
        </div>
      )}
      <FigureStage
        ref={stageRef}
        name={`Figure ${number}, grid read out`}
        place={place}
        count={grids.length}
        words={readOutWords(columns, grid)}
        onMove={(target) => setReadLabel(grids[target]?.label ?? null)}
        room={errorFigureRoom(fields.length, scales.ratio)}
      >
        {layout && columns.map((field, column) => (
          <ErrorColumn
            key={field.field} field={field} layout={layout} scales={scales} isFirst={column === 0} readH={grid.h} onPoint={readNearest}
          />
        ))}
      </FigureStage>
      <FigureCaption
        number={number}
        pointKey={<PointKey norms={norms} />}
        numbersId={numbersId}
        areNumbersShown={areNumbersShown}
        onToggleNumbers={() => setAreNumbersShown(!areNumbersShown)}
      >
        {caption}
      </FigureCaption>
      <ErrorReadOut fields={columns} grid={grid} />
      <div id={numbersId} hidden={!areNumbersShown}>{areNumbersShown && <ErrorNumbers number={number} fields={fields} grids={grids} />}</div>
    </figure>
  );
}
