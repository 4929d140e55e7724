import { set, type FieldErrors, type FieldValues, type Resolver } from 'react-hook-form';
import type { z } from 'zod';
import type { FieldProblem } from '@/lib/errors';

/** What a form comes to: what would be sent, or why not. */
export type Checked<Typed> = { ok: true; typed: Typed } | { ok: false; faults: FieldProblem[] };

export function issuesOf(error: z.ZodError): FieldProblem[] {
  return error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
}

/** A resolver for react-hook-form from a check of the whole form; the first fault of a field is the one shown. */
export function checkedResolver<Values extends FieldValues, Typed>(check: (values: Values) => Checked<Typed>, fieldOf: (path: string, values: Values) => string): Resolver<Values, unknown, Typed> {
  return (values) => {
    const checked = check(values);
    if (checked.ok) return { values: checked.typed, errors: {} };
    const errors: FieldErrors<Values> = {};
    const seen = new Set<string>();
    for (const { path, message } of checked.faults) {
      const field = fieldOf(path, values);
      if (seen.has(field)) continue;
      seen.add(field);
      set(errors, field, { type: 'checked', message });
    }
    return { values: {}, errors };
  };
}
