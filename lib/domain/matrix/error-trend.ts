import type { Assessment } from '../assessment/schema';
import { judgedFields, type JudgedField } from './judged-fields';
import type { Matrix } from './schema';
import { errorAt, finestSharedSpacing } from './shared-spacing';

/** The norm that speaks for an assessment: the first counting L2, else L∞ or a quantity's error, else any counting one. */
function leadingField(assessment: Assessment): JudgedField | undefined {
  const fields = judgedFields(assessment);
  return fields.find((field) => field.norm === 'L2') ?? fields.find((field) => field.norm !== 'L1') ?? fields[0];
}

/** Error of the latest study's leading norm over the releases, on the finest grid that all studies share. Oldest first. */
export function errorTrend(assessments: readonly { release: string; assessment: Assessment }[]): Matrix['cases'][number]['trend'] {
  const last = assessments.at(-1);
  const leading = last && leadingField(last.assessment);
  if (!leading) return [];
  const series = assessments.flatMap(({ release, assessment }) => {
    const field = judgedFields(assessment).find((each) => each.field === leading.field && each.norm === leading.norm);
    return field ? [{ release, field }] : [];
  });
  const h = finestSharedSpacing(series.map(({ field }) => field));
  if (h === null) return [];
  return series.flatMap(({ release, field }) => {
    const error = errorAt(field, h);
    return error === null ? [] : [{ release, error }];
  });
}
