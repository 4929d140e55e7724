'use client';

import { useEffect, useRef } from 'react';
import { rowsOf, type ErrorRaster } from '@/lib/figures/error-map/error-raster';
import { mapColours, mapPixels, scalePixels } from '@/lib/figures/error-map/map-colours';
import type { MapLayout } from '@/lib/figures/error-map/map-layout';
import type { MapScale } from '@/lib/figures/error-map/map-scale';
import type { Box, SceneItem } from '@/lib/figures/scene';
import { whenFacesAreThere } from '../figure-faces';
import { paintScene, readPalette } from '../paint-scene';
import { watchTheme } from '../watch-theme';

interface MapCanvasProps { raster: ErrorRaster; layout: MapLayout; scale: MapScale | null; scene: readonly SceneItem[] }

const stops = 9;

function readStops(): string[] {
  const style = getComputedStyle(document.documentElement);
  return Array.from({ length: stops }, (_, stop) => style.getPropertyValue(`--map${stop}`).trim());
}

function pictureOf(pixels: Uint8ClampedArray<ArrayBuffer>, width: number, height: number): HTMLCanvasElement {
  const picture = document.createElement('canvas');
  picture.width = width;
  picture.height = height;
  picture.getContext('2d')?.putImageData(new ImageData(pixels, width, height), 0, 0);
  return picture;
}

function paint(canvas: HTMLCanvasElement, { raster, layout, scale, scene }: MapCanvasProps) {
  const ctx = canvas.getContext('2d');
  if (!ctx) return;
  const density = window.devicePixelRatio;
  canvas.width = Math.round(layout.width * density);
  canvas.height = Math.round(layout.height * density);
  const put = (picture: HTMLCanvasElement, { left, top, width, height }: Box) => ctx.drawImage(picture, left * density, top * density, width * density, height * density);
  if (scale !== null) {
    const colours = mapColours(readStops());
    const bar = scalePixels(colours);
    ctx.imageSmoothingEnabled = false;
    put(pictureOf(mapPixels(raster, scale, colours), raster.along.bins, rowsOf(raster)), layout.box);
    put(pictureOf(bar.pixels, 1, bar.height), layout.bar);
  }
  paintScene(ctx, scene, readPalette(), density);
}

/** A map on a canvas. What it shows also stands in the read-out line and in the words beside it. */
export function MapCanvas({ raster, layout, scale, scene }: MapCanvasProps) {
  const ref = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const canvas = ref.current;
    if (!canvas) return undefined;
    let isGone = false;
    const draw = () => { if (!isGone) paint(canvas, { raster, layout, scale, scene }); };
    draw();
    whenFacesAreThere(draw);
    const unwatch = watchTheme(draw);
    return () => {
      isGone = true;
      unwatch();
    };
  }, [raster, layout, scale, scene]);
  return <canvas ref={ref} aria-hidden className="block" style={{ width: layout.width, height: layout.height }} />;
}
