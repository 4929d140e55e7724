import { compileExpressions } from '../numerics/expression/compile-expressions';
import type { Node, Variable } from '../numerics/expression/node';
import type { GridReading } from './grid-reading';

/** The exact value of every field as a node, in the order of the fields. Throws TypeError where an expression does not compile. */
export function compileExact({ mapping, problem, fields, t }: GridReading): Node[] {
  const variables = (['x', 'y', 'z'] as const satisfies Variable[]).slice(0, problem.dimension);
  const hasTime = t !== undefined || mapping.t !== undefined;
  const result = compileExpressions({
    constants: problem.constants, fields: problem.exact, variables: hasTime ? [...variables, 't'] : variables,
    compared: Object.fromEntries(fields.flatMap(({ field, compare }) => (compare === undefined ? [] : [[field, compare]]))),
  });
  if (!result.ok) {
    const [first] = result.errors;
    throw new TypeError(`readGrid: the expression of ${first?.name} is not valid: ${first?.message}`);
  }
  const { fields: exact, compared } = result.compiled;
  return fields.map(({ field, compare }) => {
    const node = compare === undefined ? exact[field] : compared[field];
    if (node === undefined) throw new TypeError(`readGrid: the field ${field} has no exact solution and no expression to compare with`);
    return node;
  });
}
