import type { FieldProblem } from '@/lib/errors';
import type { ColumnMapping } from '../columns/column-mapping';
import { refuseDialect } from '../columns/given-dialect';
import type { CaseDefinition } from './definition';

/** What is wrong with a mapping for a case: a coordinate missing or too many, or a field that the case does not declare. */
export function checkColumns(mapping: ColumnMapping, definition: CaseDefinition, problem: { dimension: number; unsteady: boolean }): FieldProblem[] {
  const faults: FieldProblem[] = [];
  (['x', 'y', 'z'] as const).forEach((axis, index) => {
    if (index < problem.dimension && mapping[axis] === undefined) {
      faults.push({ path: axis, message: `A problem of dimension ${problem.dimension} needs the column of ${axis}.` });
    }
    if (index >= problem.dimension && mapping[axis] !== undefined) {
      faults.push({ path: axis, message: `A problem of dimension ${problem.dimension} has no ${axis}.` });
    }
  });
  if (mapping.t !== undefined && !problem.unsteady) faults.push({ path: 't', message: 'The problem is steady and has no t.' });
  const dialectFault = refuseDialect(mapping.table ?? {});
  if (dialectFault !== null) faults.push({ path: 'table.decimalMark', message: dialectFault });
  const declared = definition.fields.map((field) => field.field);
  for (const [name, columns] of Object.entries(mapping.fields)) {
    const { dimension } = problem;
    if (Array.isArray(columns) && columns.length !== dimension && columns.length !== dimension + 1) {
      faults.push({ path: `fields.${name}`, message: `Found ${columns.length} columns. Expected the ${dimension} of the gradient, with or without that of the field before them.` });
    }
    if (declared.includes(name)) continue;
    const known = declared.length === 0 ? 'The case declares no field' : `The case declares ${declared.join(', ')}`;
    faults.push({ path: `fields.${name}`, message: `${known}; found ${name}.` });
  }
  return faults;
}
