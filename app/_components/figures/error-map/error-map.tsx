'use client';

import { useId, useMemo, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { formatError } from '@/lib/domain/numbers/format-error';
import { errorIn, largestBin, rowsOf, type Bin, type ErrorRaster } from '@/lib/figures/error-map/error-raster';
import { binAt, boxOf, mapLayout, type MapLayout } from '@/lib/figures/error-map/map-layout';
import { mapScale } from '@/lib/figures/error-map/map-scale';
import { mapScene } from '@/lib/figures/error-map/map-scene';
import { Sym } from '../../ui/symbols';
import { ErrorText } from '../error-text';
import { useWidth } from '../use-width';
import { MapCanvas } from './map-canvas';
import { binPlace, binWords, mapFacts } from './map-words';

export interface ErrorMapProps {
  number: number;
  raster: ErrorRaster;
  field: string;
  grid: string;
  /** L∞, and where it is. */
  largest: number;
  at: Partial<Record<'x' | 'y' | 'z', number>>;
}

const farther = 10;
const leastCursor = 9;

/** How far a key moves the bin that is read out, in columns and rows. */
const moves: Partial<Record<string, readonly [number, number]>> = {
  ArrowRight: [1, 0], ArrowLeft: [-1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1], PageUp: [0, farther], PageDown: [0, -farther],
};

const decimal = (value: number) => String(Number(value.toPrecision(3))).replace('-', '−');

/** Where on a grid the error of a field is how large: bins of the domain, their colour by the largest error in each. */
export function ErrorMap({ number, raster, field, grid, largest, at }: ErrorMapProps) {
  const stageRef = useRef<HTMLDivElement>(null);
  const factsId = useId();
  const width = useWidth(stageRef);
  const peakBin = useMemo(() => largestBin(raster) ?? { column: 0, row: 0 }, [raster]);
  const [chosen, setChosen] = useState<Bin | null>(null);
  const bin = chosen ?? peakBin;
  const layout = useMemo(() => (width ? mapLayout(raster, width) : null), [raster, width]);
  const scale = useMemo(() => mapScale(largest), [largest]);
  const scene = useMemo(() => layout && mapScene({
    raster, layout, scale, field,
    peak: largest > 0 ? { at, runs: peakRuns(largest) } : null,
  }), [raster, layout, scale, field, largest, at]);
  const [columns, rows] = [raster.along.bins, rowsOf(raster)];
  const place = [raster.along, ...(raster.up ? [raster.up] : [])].flatMap(({ name }) => (at[name] === undefined ? [] : [`${name} ${decimal(at[name])}`])).join(', ');
  const facts = useMemo(() => mapFacts(raster, { field, grid, largest, place }), [raster, field, grid, largest, place]);

  const move = (event: KeyboardEvent) => {
    const by = moves[event.key];
    if (event.key !== 'Home' && by === undefined) return;
    event.preventDefault();
    if (by === undefined) { setChosen(null); return; }
    setChosen({ column: Math.min(columns - 1, Math.max(0, bin.column + by[0])), row: Math.min(rows - 1, Math.max(0, bin.row + by[1])) });
  };
  return (
    <figure className="figure-block">
      <div ref={stageRef} className={layout ? "" : "min-h-60"}>
        {layout && scene && (
          <div
            role="slider" tabIndex={0} aria-label={`Figure ${number}, place read out`} aria-describedby={factsId} aria-valuemin={1} aria-valuemax={columns * rows}
            aria-valuenow={bin.row * columns + bin.column + 1} aria-valuetext={binWords(raster, bin)} onKeyDown={move}
            className="relative" style={{ width: layout.width, height: layout.height }}
            onPointerMove={(event) => setChosen(binUnder(event, raster, layout))} onPointerDown={(event) => setChosen(binUnder(event, raster, layout))}
          >
            <MapCanvas raster={raster} layout={layout} scale={scale} scene={scene} />
            {chosen && <Cursor box={boxOf(raster, layout, bin)} />}
          </div>
        )}
      </div>
      <p id={factsId} className="sr-only">{facts}</p>
      <MapCaption number={number} raster={raster} field={field} grid={grid} isToScale={layout?.isToScale ?? true} />
      <p className="mt-1 flex min-h-5 flex-wrap gap-x-2 text-note text-graphite print:hidden">
        <span>{binPlace(raster, bin)}:</span> <span className="text-ink"><BinError error={errorIn(raster, bin)} /></span>
      </p>
    </figure>
  );
}

function peakRuns(largest: number) {
  const { mantissa, exponent } = formatError(largest);
  return [
    { text: 'L', face: 'symbol' }, { text: '∞', face: 'index' }, { text: ` ${mantissa}\u00a0×\u00a010`, face: 'sans' },
    { text: String(exponent).replace('-', '−'), face: 'exponent' },
  ] as const;
}

function binUnder({ clientX, clientY, currentTarget }: PointerEvent<HTMLElement>, raster: ErrorRaster, layout: MapLayout): Bin {
  const { left, top } = currentTarget.getBoundingClientRect();
  return binAt(raster, layout, [clientX - left, clientY - top]);
}

function BinError({ error }: { error: number | null }) {
  return error === null ? 'no row of the file' : <ErrorText value={error} />;
}

/** Shows which bin is read out; a small one gets a frame that can be seen. */
function Cursor({ box: { left, top, width, height } }: { box: { left: number; top: number; width: number; height: number } }) {
  const [wide, high] = [Math.max(width, leastCursor), Math.max(height, leastCursor)];
  return (
    <div
      aria-hidden className="pointer-events-none absolute border-[1.5px] border-ink outline-2 outline-paper print:hidden"
      style={{ left: left + width / 2 - wide / 2, top: top + height / 2 - high / 2, width: wide, height: high }}
    />
  );
}

function MapCaption({ number, raster, field, grid, isToScale }: { number: number; raster: ErrorRaster; field: string; grid: string; isToScale: boolean }) {
  return (
    <figcaption className="mt-3 max-w-[62ch] font-serif text-caption">
      <b>Figure {number}.</b> |error| of <Sym>{field}</Sym> on grid {grid}, the largest in each of {raster.along.bins}{raster.up && ` × ${raster.up.bins}`} bins
      {raster.over && <> over all <Sym>{raster.over}</Sym></>}, log scale. It vanishes where it changes sign.
      {raster.errors.includes(null) && ' Bins left plain hold no row of the file.'}
      {!isToScale && ' The two directions are not drawn to one scale.'}
    </figcaption>
  );
}
