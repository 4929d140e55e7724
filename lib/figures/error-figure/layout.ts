/** Distances of an error figure in pixels; the figure is drawn at the width it has, its text never scaled. */
interface FigureMetrics { left: number; gap: number; top: number; between: number; order: number; foot: number }

const wideMetrics: FigureMetrics = { left: 58, gap: 34, top: 46, between: 34, order: 148, foot: 32 };
const narrowMetrics: FigureMetrics = { left: 50, gap: 34, top: 46, between: 34, order: 128, foot: 46 };

/** Below this width one field is shown at a time. */
const narrowBelow = 652;
export const mostColumns = 3;
/** A panel on its own would grow past the height of a screen. */
const widestPanel = 520;

export interface ErrorFigureLayout {
  isNarrow: boolean;
  columns: number;
  metrics: FigureMetrics;
  panelWidth: number;
  errorHeight: number;
  height: number;
}

/** How an error figure of so many fields fills a width; `ratio` is the height of an error panel over its width. */
export function errorFigureLayout(width: number, fields: number, ratio: number): ErrorFigureLayout {
  const isNarrow = width < narrowBelow;
  const columns = isNarrow || fields > mostColumns ? 1 : fields;
  const metrics = isNarrow ? narrowMetrics : wideMetrics;
  const room = (width - metrics.left - metrics.gap * (columns - 1)) / columns;
  const panelWidth = Math.max(120, Math.floor(Math.min(widestPanel, room)));
  const errorHeight = Math.round(panelWidth * ratio);
  const height = metrics.top + errorHeight + metrics.between + metrics.order + metrics.foot;
  return { isNarrow, columns, metrics, panelWidth, errorHeight, height };
}

/** The heights to keep free before the width is known, as CSS lengths of a size container: the same sum as the layout. */
export function errorFigureRoom(fields: number, ratio: number): { narrow: string; wide: string } {
  const room = ({ left, gap, top, between, order, foot }: FigureMetrics, columns: number) => {
    const fixed = top + between + order + foot;
    const panel = `min(${widestPanel}px, (100cqw - ${left + gap * (columns - 1)}px) / ${columns})`;
    return `calc(${fixed}px + ${ratio.toFixed(4)} * ${panel})`;
  };
  return { narrow: room(narrowMetrics, 1), wide: room(wideMetrics, fields > mostColumns ? 1 : fields) };
}
