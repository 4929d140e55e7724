import { figureFields } from '@/lib/figures/error-figure/figure-fields';
import { errorFigureScales } from '@/lib/figures/error-figure/scales';
import type { FieldAssessment } from '@/lib/numerics/assessment';

/** The note beside an error figure: what the dashes are, and that the formal order rises at 45° where it does. */
export function ErrorFigureNote({ fields }: { fields: readonly FieldAssessment[] }) {
  const scales = errorFigureScales(figureFields(fields));
  const hasFormal = fields.some(({ formalOrder, derivedOrder }) => (derivedOrder ?? formalOrder) !== null);
  if (!scales || !hasFormal) return null;
  return (
    <p>
      Dashed: formal order through the finest point.
      {scales.orderAt45 !== null && ` Axes are scaled so that order ${scales.orderAt45} rises at 45°.`}
    </p>
  );
}
