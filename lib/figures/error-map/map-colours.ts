import { rowsOf, type ErrorRaster } from './error-raster';
import { placeOnScale, type MapScale } from './map-scale';

type Triple = readonly [number, number, number];
const steps = 256;

function toLinear(byte: number): number {
  const share = byte / 255;
  return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
}

function toByte(linear: number): number {
  const share = linear <= 0.0031308 ? linear * 12.92 : 1.055 * linear ** (1 / 2.4) - 0.055;
  return Math.round(255 * Math.min(1, Math.max(0, share)));
}

const fromHex = (hex: string): Triple => {
  const found = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(hex.trim());
  if (!found) throw new TypeError(`mapColours needs colours such as #4f88c9, got ${hex}`);
  return [1, 2, 3].map((part) => toLinear(parseInt(found[part] ?? '', 16))) as unknown as Triple;
};

/** OKLab of linear sRGB and back (B. Ottosson, A perceptual color space for image processing, 2020). */
function toLab([r, g, b]: Triple): Triple {
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

function fromLab([lightness, a, b]: Triple): Triple {
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ];
}

/** 256 colours, three bytes each, evenly between stops such as `#4f88c9` from low to high, straight from stop to stop in OKLab. */
export function mapColours(stops: readonly string[]): Uint8Array {
  if (stops.length < 2) throw new RangeError(`mapColours needs two stops at least, got ${stops.length}`);
  const labs = stops.map((stop) => toLab(fromHex(stop)));
  const colours = new Uint8Array(steps * 3);
  for (let step = 0; step < steps; step += 1) {
    const place = (step / (steps - 1)) * (labs.length - 1);
    const at = Math.min(labs.length - 2, Math.floor(place));
    const [low, high] = [labs[at] as Triple, labs[at + 1] as Triple];
    const mixed = low.map((value, part) => value + (place - at) * ((high[part] ?? 0) - value)) as unknown as Triple;
    colours.set(fromLab(mixed).map(toByte), step * 3);
  }
  return colours;
}

/** The picture of a map, four bytes a bin, its top row first; bins without a row are left clear. */
export function mapPixels(raster: ErrorRaster, scale: MapScale, colours: Uint8Array): Uint8ClampedArray<ArrayBuffer> {
  const [width, height] = [raster.along.bins, rowsOf(raster)];
  const pixels = new Uint8ClampedArray(width * height * 4);
  for (const [index, error] of raster.errors.entries()) {
    if (error === null) continue;
    const step = Math.round(placeOnScale(error, scale) * (steps - 1)) * 3;
    const row = height - 1 - Math.floor(index / width);
    pixels.set([colours[step] ?? 0, colours[step + 1] ?? 0, colours[step + 2] ?? 0, 255], (row * width + (index % width)) * 4);
  }
  return pixels;
}

/** The scale itself as a picture one bin wide, its highest colour first. */
export function scalePixels(colours: Uint8Array): { pixels: Uint8ClampedArray<ArrayBuffer>; height: number } {
  const pixels = new Uint8ClampedArray(steps * 4);
  for (let step = 0; step < steps; step += 1) {
    const from = (steps - 1 - step) * 3;
    pixels.set([colours[from] ?? 0, colours[from + 1] ?? 0, colours[from + 2] ?? 0, 255], step * 4);
  }
  return { pixels, height: steps };
}
