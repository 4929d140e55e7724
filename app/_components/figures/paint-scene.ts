import type { Ink, SceneItem, ScenePath, SceneText, TextRun } from '@/lib/figures/scene';

export type Palette = Record<Ink, string>;

const inks: Ink[] = ['paper', 'ink', 'graphite', 'rule', 'hairline', 'band', 'band2', 's1', 's2', 'si'];

/** The tokens as they stand now, for the theme and the medium in force. */
export function readPalette(): Palette {
  const style = getComputedStyle(document.documentElement);
  return Object.fromEntries(inks.map((ink) => [ink, style.getPropertyValue(`--${ink}`).trim()])) as Palette;
}

const serif = "'STIX Two Text', 'Fourfold Signs Serif', georgia, serif";
const sans = "'Source Sans 3', 'Fourfold Signs Sans', arial, sans-serif";
const faces: Record<TextRun['face'], { font: string; shift: number }> = {
  sans: { font: `12.5px ${sans}`, shift: 0 },
  title: { font: `600 13.5px ${sans}`, shift: 0 },
  symbol: { font: `italic 15px ${serif}`, shift: 0 },
  index: { font: `11px ${serif}`, shift: 3 },
  exponent: { font: `9.5px ${sans}`, shift: -5 },
};

function paintText(ctx: CanvasRenderingContext2D, text: SceneText, palette: Palette) {
  const widths = text.runs.map(({ text: run, face }) => {
    ctx.font = faces[face].font;
    return ctx.measureText(run).width;
  });
  const total = widths.reduce((sum, width) => sum + width, 0);
  let x = text.x - (text.anchor === 'start' ? 0 : text.anchor === 'end' ? total : total / 2);
  ctx.fillStyle = palette[text.ink];
  text.runs.forEach(({ text: run, face }, place) => {
    ctx.font = faces[face].font;
    ctx.fillText(run, x, text.y + faces[face].shift);
    x += widths[place] ?? 0;
  });
}

function paintPath(ctx: CanvasRenderingContext2D, item: ScenePath, palette: Palette) {
  ctx.save();
  if (item.clip) {
    ctx.beginPath();
    ctx.rect(item.clip.left, item.clip.top, item.clip.width, item.clip.height);
    ctx.clip();
  }
  if (item.at) ctx.translate(item.at[0], item.at[1]);
  const path = new Path2D(item.path);
  if (item.fill) {
    ctx.fillStyle = palette[item.fill];
    ctx.fill(path);
  }
  if (item.stroke) {
    ctx.strokeStyle = palette[item.stroke];
    ctx.lineWidth = item.width ?? 1;
    ctx.setLineDash(item.dash ? [...item.dash] : []);
    ctx.stroke(path);
  }
  ctx.restore();
}

/** Paints a scene in CSS pixels onto a canvas of `density` device pixels each. */
export function paintScene(ctx: CanvasRenderingContext2D, items: readonly SceneItem[], palette: Palette, density: number) {
  ctx.save();
  ctx.setTransform(density, 0, 0, density, 0, 0);
  ctx.textAlign = 'left';
  ctx.textBaseline = 'alphabetic';
  for (const item of items) {
    if (item.kind === 'text') paintText(ctx, item, palette);
    else paintPath(ctx, item, palette);
  }
  ctx.restore();
}
