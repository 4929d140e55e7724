import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { largestBin, type ErrorRaster } from '@/lib/figures/error-map/error-raster';
import { mapColours, mapPixels, scalePixels } from '@/lib/figures/error-map/map-colours';
import { binAt, binBounds, boxOf, mapLayout, placeOf } from '@/lib/figures/error-map/map-layout';
import { mapScale, placeOnScale } from '@/lib/figures/error-map/map-scale';
import { mapScene } from '@/lib/figures/error-map/map-scene';

const raster = (columns: number, rows: number, { width = 1, height = 1 } = {}): ErrorRaster => ({
  along: { name: 'x', from: 0, to: width, bins: columns }, up: { name: 'y', from: -1, to: -1 + height, bins: rows }, over: null,
  errors: Array.from({ length: columns * rows }, (_, index) => (index === 1 ? null : 1e-5 * (index + 1))),
});
const strip: ErrorRaster = { along: { name: 'x', from: 0, to: 2, bins: 4 }, up: null, over: null, errors: [1, 2, 3, null] };

describe('mapScale(largest)', () => {
  it.each([[3.1e-3, -6, -2], [1e-3, -7, -3], [1000, -1, 3], [5, -3, 1], [1e-300, -304, -300]])('of %d runs four decades down from the one above', (largest, from, to) => {
    expect(mapScale(largest)).toEqual({ from, to });
  });

  it('is none where there is no error, and ends where errors do', () => {
    expect(mapScale(0)).toBeNull();
    expect([0, 1e-9, 1e-6, 1e-4, 1e-2, 1].map((error) => placeOnScale(error, { from: -6, to: -2 }))).toEqual([0, 0, 0, 0.5, 1, 1]);
  });
});

describe('mapColours(stops)', () => {
  const light = ['#ebf6f7', '#b4dfec', '#83c5e4', '#60a8da', '#4f88c9', '#4969b0', '#444c8e', '#3b3269', '#2c1d43'];
  /** Relative luminance as WCAG 2 has it, computed apart from the code under test. */
  const luminance = (colours: Uint8Array, step: number) => [0.2126, 0.7152, 0.0722].reduce((sum, weight, part) => {
    const share = (colours[step * 3 + part] ?? 0) / 255;
    return sum + weight * (share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4);
  }, 0);

  it('begins and ends at the outer stops and passes through those between', () => {
    const colours = mapColours(light);
    expect([...colours.slice(0, 3)]).toEqual([0xeb, 0xf6, 0xf7]);
    expect([...colours.slice(-3)]).toEqual([0x2c, 0x1d, 0x43]);
    // 256 steps over eight spans: the stop in the middle lies between two of them.
    for (const [part, byte] of [0x4f, 0x88, 0xc9].entries()) expect(Math.abs((colours[127 * 3 + part] ?? 0) - byte)).toBeLessThanOrEqual(2);
  });

  it('gets darker with every step, so that it reads in grey and for colour-blind eyes', () => {
    const colours = mapColours(light);
    for (let step = 1; step < 256; step += 1) expect(luminance(colours, step)).toBeLessThan(luminance(colours, step - 1) + 1e-3);
  });

  it('refuses what is no colour', () => {
    expect(() => mapColours(['#fff', '#000000'])).toThrow('got #fff');
    expect(() => mapColours(['#ffffff'])).toThrow('got 1');
  });
});

describe('mapPixels(raster, scale, colours)', () => {
  it('puts the lowest row last and leaves bins without a row clear', () => {
    const colours = mapColours(['#000000', '#ffffff']);
    const pixels = mapPixels({ ...raster(2, 2), errors: [1, null, 1e-4, 1e-9] }, { from: -4, to: 0 }, colours);
    expect([...pixels]).toEqual([0, 0, 0, 255, 0, 0, 0, 255, 255, 255, 255, 255, 0, 0, 0, 0]);
    const { pixels: bar, height } = scalePixels(colours);
    expect([bar.length, height, bar[0], bar.at(-4)]).toEqual([1024, 256, 255, 0]);
  });
});

describe('mapLayout(raster, width)', () => {
  it('has both directions to one scale, within the width', () => {
    fc.assert(fc.property(fc.double({ min: 0.25, max: 4, noNaN: true }), fc.integer({ min: 330, max: 1200 }), (ratio, width) => {
      const layout = mapLayout(raster(8, 8, { height: ratio }), width);
      expect(layout.width).toBeLessThanOrEqual(width);
      if (layout.isToScale) expect(layout.box.height / layout.box.width / ratio).toBeCloseTo(1, 1);
    }));
    expect(mapLayout(raster(8, 8), 840)).toMatchObject({ isToScale: true, box: { width: 320, height: 320 } });
  });

  it('says where a thin domain is drawn thicker than it is', () => {
    expect(mapLayout(raster(64, 4, { width: 40 }), 840)).toMatchObject({ isToScale: false, box: { height: 64 } });
    expect(mapLayout(strip, 350)).toMatchObject({ isToScale: true, box: { height: 36 } });
  });

  it('finds each bin again by a place inside of it', () => {
    const shown = raster(7, 5, { height: 0.7 });
    const layout = mapLayout(shown, 500);
    for (let column = 0; column < 7; column += 1) {
      for (let row = 0; row < 5; row += 1) {
        const { left, top, width, height } = boxOf(shown, layout, { column, row });
        expect(binAt(shown, layout, [left + width / 2, top + height / 2])).toEqual({ column, row });
        const [, { bounds: [low, high] = [0, 0] } = {}] = binBounds(shown, { column, row });
        const place = placeOf(shown, layout, { x: 0, y: (low + high) / 2 });
        expect(place?.[1]).toBeCloseTo(top + height / 2, 9);
      }
    }
    expect(binAt(shown, layout, [-50, 1e4])).toEqual({ column: 0, row: 0 });
  });
});

describe('mapScene(…)', () => {
  const textsOf = (items: ReturnType<typeof mapScene>) => items.flatMap((item) => (item.kind === 'text' ? [item.runs.map(({ text }) => text).join('')] : []));

  it('names the decades of the scale, the directions and the largest error', () => {
    const shown = raster(4, 4);
    const layout = mapLayout(shown, 500);
    const texts = textsOf(mapScene({ raster: shown, layout, scale: { from: -7, to: -3 }, field: 'u', peak: { at: { x: 1, y: 0 }, runs: [{ text: 'peak', face: 'sans' }] } }));
    expect(texts).toEqual(expect.arrayContaining(['|error| of u', 'x', 'y', '10−7', '10−3', 'peak', '0.0', '1.0', '−1.0']));
  });

  it('keeps the words of the largest error inside, wherever it is', () => {
    const shown = raster(4, 4);
    const layout = mapLayout(shown, 350);
    for (const x of [0, 0.5, 1]) {
      for (const y of [-1, -0.5, 0]) {
        const items = mapScene({ raster: shown, layout, scale: null, field: 'u', peak: { at: { x, y }, runs: [{ text: 'L', face: 'symbol' }, { text: ' 2.20 × 10−4', face: 'sans' }] } });
        const patch = items.findLast((item) => item.kind === 'path' && /^M[\d.]+ [\d.]+h/.test(item.path));
        const [, left = '', top = '', wide = ''] = (patch?.kind === 'path' ? /^M([\d.]+) ([\d.]+)h([\d.]+)/.exec(patch.path) : null) ?? [];
        expect(Number(left)).toBeGreaterThanOrEqual(0);
        expect(Number(left) + Number(wide)).toBeLessThanOrEqual(layout.width);
        expect(Number(top)).toBeGreaterThanOrEqual(0);
        expect(Number(top) + 22).toBeLessThanOrEqual(layout.height);
      }
    }
  });

  it('has one direction where the problem has one', () => {
    expect(textsOf(mapScene({ raster: strip, layout: mapLayout(strip, 500), scale: { from: -3, to: 1 }, field: 'u', peak: null }))).not.toContain('y');
    expect(largestBin(strip)).toEqual({ column: 2, row: 0 });
    expect(largestBin({ ...strip, errors: [null, null, null, null] })).toBeNull();
  });
});
