import type { FieldAssessment } from '../../numerics/assessment';
import { isDrawn, type FigureField } from './figure-fields';
import { slopeTriangle } from './slope-triangle';

interface Range { from: number; to: number }

/** The axes that all panels of an error figure share; spacing and error in log10. */
export interface ErrorFigureScales {
  spacing: Range;
  error: Range;
  order: Range;
  /** Height of the error panel over its width. */
  ratio: number;
  /** The formal order that rises at 45°, null where the panel had to be clamped or there is no formal order. */
  orderAt45: number | null;
}

const room = { fine: 0.13, coarse: 0.235, above: 0.12, below: 0.2, triangle: 0.22 };
const flattest = 0.6;
const tallest = 1.5;
const widestOrders = 8;

const orderOf = (series: FieldAssessment) => series.derivedOrder ?? series.formalOrder;

function orderRange(series: readonly FieldAssessment[]): Range {
  const formal = series.map(orderOf).filter((order) => order !== null);
  const seen = series.flatMap(({ orders }) => orders.map(({ order }) => order)).filter((order) => order !== null);
  const middle = formal.length > 0 ? formal : seen.length > 0 ? seen : [1];
  const [low, high] = [Math.min(...middle) - 1.1, Math.max(...middle) + 0.6];
  const near = seen.filter((order) => order > low - widestOrders && order < high + widestOrders);
  return { from: Math.min(low, ...near.map((order) => order - 0.15)), to: Math.max(high, ...near.map((order) => order + 0.15)) };
}

/** Null where no grid has an error above zero: there is nothing to draw. */
export function errorFigureScales(fields: readonly FigureField[]): ErrorFigureScales | null {
  const series = fields.flatMap(({ norms }) => norms);
  const points = series.flatMap(({ grids }) => grids.filter(isDrawn));
  if (points.length === 0) return null;
  const logs = points.map(({ h }) => Math.log10(h));
  const errors = points.map(({ error }) => Math.log10(error));
  const feet = fields.map(slopeTriangle).filter((triangle) => triangle !== null).map(({ base }) => base - room.triangle);
  const spacing = { from: Math.min(...logs) - room.fine, to: Math.max(...logs) + room.coarse };
  const error = { from: Math.min(Math.min(...errors) - room.below, ...feet), to: Math.max(...errors) + room.above };
  const lead = series.find((each) => each.counts && orderOf(each) !== null) ?? series.find((each) => orderOf(each) !== null);
  const formal = lead ? orderOf(lead) : null;
  const decades = (error.to - error.from) / (spacing.to - spacing.from);
  const wanted = decades / (formal !== null && formal > 0 ? formal : 2);
  const ratio = Math.min(tallest, Math.max(flattest, wanted));
  return { spacing, error, order: orderRange(series), ratio, orderAt45: ratio === wanted ? formal : null };
}
