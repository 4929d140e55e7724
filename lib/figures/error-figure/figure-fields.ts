import { norms, type FieldAssessment, type FieldGrid, type SeriesNorm } from '../../numerics/assessment';

export interface FigureField {
  field: string;
  norms: FieldAssessment[];
  /** Every grid of the field, finest first. */
  grids: { label: string; h: number }[];
}

/** Errors of zero have no place on a logarithmic axis. */
export const isDrawn = (grid: FieldGrid): boolean => grid.error > 0 && Number.isFinite(grid.error);

const normOrder: SeriesNorm[] = [...norms, 'value'];

/** The assessments of a figure gathered by field, in the order in which the fields come; those of parts of the domain are left out. */
export function figureFields(assessments: readonly FieldAssessment[]): FigureField[] {
  const fields = new Map<string, FigureField>();
  for (const assessment of assessments) {
    if (assessment.region !== 'all') continue;
    const entry = fields.get(assessment.field) ?? { field: assessment.field, norms: [], grids: [] };
    entry.norms.push(assessment);
    for (const { label, h } of assessment.grids) {
      if (!entry.grids.some((grid) => grid.label === label)) entry.grids.push({ label, h });
    }
    fields.set(assessment.field, entry);
  }
  for (const entry of fields.values()) {
    entry.grids.sort((a, b) => a.h - b.h);
    entry.norms.sort((a, b) => normOrder.indexOf(a.norm) - normOrder.indexOf(b.norm));
  }
  return [...fields.values()];
}
