import { ErrorText } from '../figures/error-text';
import { Sym } from '../ui/symbols';
import { poissonErrors, type GridErrors } from './poisson-errors';
import { mapColour } from './map-colour';
import { errorScale, levels, rasterPaths, type ErrorScale } from './raster-paths';
import './error-map.css';

interface Rasters { grids: GridErrors[]; scale: ErrorScale }
let computed: Rasters | undefined;

/** Solved at the first request and kept: the answer never changes. */
function frontRasters(): Rasters {
  const grids = computed?.grids ?? [8, 16, 32, 64].map(poissonErrors);
  computed ??= { grids, scale: errorScale(grids) };
  return computed;
}

function Raster({ grid, scale }: { grid: GridErrors; scale: ErrorScale }) {
  const { cells } = grid;
  const lines = Array.from({ length: cells - 1 }, (_, index) => `M${index + 1} 0V${cells}M0 ${index + 1}H${cells}`).join('');
  return (
    <svg viewBox={`0 0 ${cells} ${cells}`} className="block aspect-square w-full border border-rule" shapeRendering="crispEdges" aria-hidden>
      {rasterPaths(grid, scale).map(({ level, path }) => <path key={level} d={path} style={{ fill: mapColour(level) }} />)}
      {cells <= 16 && <path d={lines} fill="none" className="stroke-paper" strokeWidth="1" vectorEffect="non-scaling-stroke" />}
    </svg>
  );
}

export function ErrorRasters() {
  const { grids, scale } = frontRasters();
  return (
    <ol className="grid grid-cols-2 gap-x-5 gap-y-6 tablet:grid-cols-4 wide:gap-x-8">
      {grids.map((grid, index) => {
        const before = grids[index - 1];
        return (
          <li key={grid.cells}>
            <Raster grid={grid} scale={scale} />
            <p className="mt-1 text-note text-graphite"><Sym>h</Sym> = 1/{grid.cells}</p>
            <p className="flex flex-wrap justify-between gap-x-2">
              <ErrorText value={grid.l2} />
              {before && <span className="text-graphite">÷ {(before.l2 / grid.l2).toFixed(2)}</span>}
            </p>
          </li>
        );
      })}
    </ol>
  );
}

/** The scale of the pictures, for the margin. */
export function RasterScale() {
  const { scale } = frontRasters();
  const stops = Array.from({ length: levels }, (_, level) => mapColour(level)).join(', ');
  const decades = [scale.topDecade - scale.decades, scale.topDecade - scale.decades / 2, scale.topDecade];
  return (
    <div>
      <div className="h-2.5 border border-rule" style={{ background: `linear-gradient(to right in oklab, ${stops})` }} />
      <p className="flex justify-between">{decades.map((decade) => <span key={decade}>10<sup>{decade < 0 ? `−${-decade}` : decade}</sup></span>)}</p>
    </div>
  );
}
