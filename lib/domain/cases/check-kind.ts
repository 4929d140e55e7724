import type { FieldProblem } from '@/lib/errors';
import type { CaseDefinition, CaseKind } from './definition';

/** What each kind of case needs to be judged by. */
export function checkKind({ fields, quantities }: CaseDefinition, kind: CaseKind): FieldProblem[] {
  switch (kind) {
    case 'order':
      return fields.length + quantities.length > 0 ? [] : [{ path: 'fields', message: 'An order case needs a field or a quantity to observe the order of.' }];
    case 'exactness': {
      const norms = fields.flatMap((field, i) => field.norms.map((norm, j) => ({ ...norm, path: `fields.${i}.norms.${j}.expectExact` })));
      if (!norms.some((norm) => norm.counts)) return [{ path: 'fields', message: 'An exactness case needs a field with a norm that counts.' }];
      return norms.filter((norm) => norm.counts && !norm.expectExact)
        .map(({ path, norm }) => ({ path, message: `In an exactness case every norm that counts is expected to be exact; ${norm} is not.` }));
    }
    case 'benchmark':
      return quantities.some((quantity) => quantity.knownValue !== undefined) ? []
        : [{ path: 'quantities', message: 'A benchmark case needs a quantity with a known value.' }];
    case 'solution':
      return [
        ...(quantities.length > 0 ? [] : [{ path: 'quantities', message: 'A solution case needs a quantity.' }]),
        ...(fields.length === 0 ? [] : [{ path: 'fields', message: 'A solution case has no exact solution to compare a field with. Make an order case, or leave the fields out.' }]),
      ];
  }
}
