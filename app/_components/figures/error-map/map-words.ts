import { formatError } from '@/lib/domain/numbers/format-error';
import { errorIn, type Bin, type ErrorRaster } from '@/lib/figures/error-map/error-raster';
import { binBounds } from '@/lib/figures/error-map/map-layout';

const short = (value: number) => String(Number(value.toPrecision(3))).replace('-', '−');

/** Where a bin lies: “x 0.25 to 0.5, y 0 to 0.25”. */
export function binPlace(raster: ErrorRaster, bin: Bin): string {
  return binBounds(raster, bin).map(({ name, bounds: [from, to] }) => `${name} ${short(from)} to ${short(to)}`).join(', ');
}

export function binWords(raster: ErrorRaster, bin: Bin): string {
  const error = errorIn(raster, bin);
  return `${binPlace(raster, bin)}: ${error === null ? 'no row of the file' : formatError(error).text}`;
}

/** What a look at the map tells: how large, where, and how much of the domain comes near it. */
export function mapFacts(raster: ErrorRaster, { field, grid, largest, place }: { field: string; grid: string; largest: number; place: string }): string {
  const filled = raster.errors.filter((error) => error !== null);
  const near = filled.filter((error) => error >= largest / 10).length;
  const share = Math.round((100 * near) / Math.max(1, filled.length));
  const sorted = [...filled].sort((a, b) => a - b);
  const middle = sorted[Math.floor(sorted.length / 2)] ?? 0;
  const begin = `Map of the largest error of ${field} on grid ${grid}.`;
  if (largest === 0) return `${begin} The error is zero everywhere.`;
  return `${begin} It is largest at ${place}, ${formatError(largest).text}; in ${share} % of the bins it is more than a tenth of that, in half of them less than ${formatError(middle).text}.`;
}
