import { checkProblem } from '@/lib/domain/problems/check-problem';
import { createProblemSchema, problemDefinitionSchema, type CreateProblemInput, type Equation, type Problem } from '@/lib/domain/problems/schema';
import type { FieldProblem } from '@/lib/errors';
import { issuesOf, type Checked } from '../forms/checked-resolver';
import { typedNumber } from '../forms/typed-number';

interface NamedText { name: string; text: string }

/** A problem as it is typed. */
export interface ProblemValues {
  name: string; slug: string; equation: Equation; form: string; dimension: '1' | '2' | '3'; unsteady: boolean;
  exact: NamedText[]; constants: NamedText[];
  /** From and to along x, y, z. */
  domain: { from: string; to: string }[];
}

const axes = ['x', 'y', 'z'] as const;
const nowhere = { from: '', to: '' };

export const emptyProblem: ProblemValues = {
  name: '', slug: '', equation: 'none', form: '', dimension: '1', unsteady: false,
  exact: [{ name: 'u', text: '' }], constants: [], domain: [nowhere, nowhere, nowhere],
};

export function valuesOfProblem(problem: Problem): ProblemValues {
  const rows = (named: Record<string, number | string>) => Object.entries(named).map(([name, text]) => ({ name, text: String(text) }));
  return {
    name: problem.name, slug: problem.slug, equation: problem.equation, form: problem.form ?? '', dimension: `${problem.dimension}`,
    unsteady: problem.unsteady, exact: rows(problem.exact ?? {}), constants: rows(problem.constants),
    domain: axes.map((axis) => {
      const interval = problem.domain?.[axis];
      return interval ? { from: String(interval[0]), to: String(interval[1]) } : nowhere;
    }),
  };
}

const isBlank = ({ name, text }: NamedText) => name.trim() === '' && text.trim() === '';

const named = (rows: NamedText[]) => Object.fromEntries(rows.filter((row) => !isBlank(row)).map(({ name, text }) => [name.trim(), text.trim()]));

function definitionOf(values: ProblemValues): unknown {
  const domain = values.domain.slice(0, Number(values.dimension)).flatMap(({ from, to }, index) => (from.trim() === '' && to.trim() === '' ? [] : [[axes[index], [typedNumber(from), typedNumber(to)]]]));
  const constants = Object.entries(named(values.constants)).map(([name, text]) => [name, text === '' ? text : typedNumber(text)]);
  return {
    name: values.name, slug: values.slug.trim() === '' ? undefined : values.slug, equation: values.equation, form: values.form,
    dimension: Number(values.dimension), unsteady: values.unsteady, exact: named(values.exact),
    constants: Object.fromEntries(constants) as Record<string, unknown>, domain: Object.fromEntries(domain) as Record<string, unknown>,
  };
}

/** Names that cannot be names, or stand twice. */
function nameFaults(rows: NamedText[], list: 'exact' | 'constants'): FieldProblem[] {
  return rows.flatMap((row, index) => {
    const name = row.name.trim();
    const path = `${list}#${index}.name`;
    if (isBlank(row)) return [];
    if (!/^[A-Za-z][A-Za-z0-9_]{0,39}$/.test(name)) return [{ path, message: `Not a name.${name === '' ? '' : ` Found “${name}”.`} Expected a letter, then letters, digits or underscores, such as nu.` }];
    return rows.findIndex((other) => other.name.trim() === name) < index ? [{ path, message: `Twice. The name ${name} stands above already.` }] : [];
  });
}

export function checkProblemValues(values: ProblemValues): Checked<CreateProblemInput> {
  const faults = [...nameFaults(values.exact, 'exact'), ...nameFaults(values.constants, 'constants')];
  if (faults.length > 0) return { ok: false, faults };
  const parsed = createProblemSchema.safeParse(definitionOf(values));
  if (parsed.success) {
    const found = checkProblem(parsed.data);
    return found.length === 0 ? { ok: true, typed: parsed.data } : { ok: false, faults: found };
  }
  // Expressions are checked as they are typed, also while the name is still missing.
  const definition = problemDefinitionSchema.loose().safeParse(definitionOf(values));
  return { ok: false, faults: [...issuesOf(parsed.error), ...(definition.success ? checkProblem(definition.data) : [])] };
}

/** The field of the form for a path of the definition, such as `exact.u`. */
export function problemField(path: string, values: ProblemValues): string {
  const [list, key = '', part] = path.split('.');
  if (list === 'domain') return `domain.${Math.max(0, axes.findIndex((axis) => axis === key))}.${part === '1' ? 'to' : 'from'}`;
  if (list?.includes('#')) return path.replace('#', '.');
  if (list !== 'exact' && list !== 'constants') return path;
  const index = values[list].findIndex(({ name }) => name.trim() === key);
  return index === -1 ? path : `${list}.${index}.text`;
}
