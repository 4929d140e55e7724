import type { FieldProblem } from '@/lib/errors';

/** A fault for every name that an earlier one has too. */
export function repeated(names: readonly string[], pathOf: (index: number) => string, what: string): FieldProblem[] {
  return names.flatMap((name, index) => (names.indexOf(name) === index ? [] : [{ path: pathOf(index), message: `${what} ${name} is there twice. Expected each once.` }]));
}
