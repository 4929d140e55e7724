import type { FieldProblem } from '@/lib/errors';
import { defaultTolerance } from '@/lib/numerics/outcome/default-tolerance';
import { regularOrder } from '@/lib/numerics/outcome/regular-order';
import { compileExpressions } from '@/lib/numerics/expression/compile-expressions';
import type { ProblemDefinition } from '../problems/schema';
import { variablesOf } from '../problems/variables';
import type { DeclaredField, DeclaredNorm } from './definition';
import { checkRigid } from './check-rigid';
import { repeated } from './repeated';

/** Fields must be in the exact solution, where the problem has one; where it has none, their errors are typed, or the solutions of successive grids compared. */
export function checkFields(fields: readonly DeclaredField[], problem: ProblemDefinition): FieldProblem[] {
  const known = Object.keys(problem.exact ?? {});
  return [
    ...repeated(fields.map((field) => field.field), (index) => `fields.${index}.field`, 'Field'),
    ...checkRigid(fields, problem.dimension),
    ...fields.flatMap((field, index): FieldProblem[] => {
      const path = `fields.${index}`;
      const isUnknown = known.length > 0 && !known.includes(field.field) && field.compare === undefined;
      return [
        ...(isUnknown ? [{ path: `${path}.field`, message: `Found ${field.field}. The problem’s exact solution has ${known.join(', ')}.` }] : []),
        ...repeated(field.norms.map((norm) => norm.norm), (at) => `${path}.norms.${at}.norm`, 'Norm'),
        ...checkCompared(field, problem, path),
        ...checkCounting(field.norms, `${path}.norms`),
        ...field.norms.flatMap((norm, at) => checkNorm(norm, `${path}.norms.${at}`)),
      ];
    }),
  ];
}

/** What a field is compared with must be an expression of the exact fields; its gradient is that of an exact field. */
function checkCompared({ field, compare, norms }: DeclaredField, problem: ProblemDefinition, path: string): FieldProblem[] {
  if (compare === undefined) return [];
  const { constants, exact = {} } = problem;
  const compiled = compileExpressions({ constants, fields: exact, variables: variablesOf(problem), compared: { [field]: compare } });
  const faults = compiled.ok ? [] : compiled.errors.filter(({ name }) => name === field).map(({ position, message }) => ({ path: `${path}.compare`, message: `Character ${position}: ${message}` }));
  const gradient = norms.findIndex(({ norm }) => norm === 'H1' || norm === 'energy');
  return gradient === -1 ? faults : [...faults, { path: `${path}.norms.${gradient}.norm`, message: 'H1 and energy norms are of exact fields. Leave the comparison out, or compare each derivative as a field of its own.' }];
}

/** A band of one cell with error h leaves L1 at its order: L1 proves nothing alone. */
function checkCounting(norms: readonly DeclaredNorm[], path: string): FieldProblem[] {
  const counting = norms.filter((norm) => norm.counts && (norm.formalOrder !== undefined || norm.derivedOrder !== undefined || norm.expectExact));
  const lone = norms.findIndex((norm) => norm.norm === 'L1' && counting.includes(norm));
  if (lone === -1 || counting.some((norm) => norm.norm !== 'L1')) return [];
  return [{ path: `${path}.${lone}.counts`, message: 'L1 may not count alone. Let L2 or L∞ count beside it.' }];
}

function checkNorm({ norm, formalOrder, derivedOrder, tolerance, regularity, logFactor }: DeclaredNorm, path: string): FieldProblem[] {
  const faults: FieldProblem[] = [];
  if (formalOrder === undefined && regularity !== undefined) faults.push({ path: `${path}.regularity`, message: 'A regularity limits a formal order. State the formal order too.' });
  if (formalOrder === undefined && logFactor !== undefined) faults.push({ path: `${path}.logFactor`, message: 'A log factor stands beside a formal order. State the formal order too.' });
  if (formalOrder === undefined && derivedOrder !== undefined) {
    faults.push({ path: `${path}.derivedOrder`, message: 'A derived order stands beside a formal order. State the formal order too.' });
  }
  if (formalOrder !== undefined && derivedOrder !== undefined && derivedOrder <= formalOrder) {
    faults.push({ path: `${path}.derivedOrder`, message: `Found ${derivedOrder}. Expected more than the formal order ${formalOrder}.` });
  }
  if (tolerance === undefined) return faults;
  const judgedOrder = derivedOrder ?? (formalOrder === undefined || regularity === undefined ? formalOrder : regularOrder(norm, formalOrder, regularity));
  if (judgedOrder === undefined) {
    faults.push({ path: `${path}.tolerance`, message: 'A tolerance needs a formal order to stand about.' });
    return faults;
  }
  const largest = defaultTolerance(norm, judgedOrder);
  if (tolerance > largest) {
    faults.push({ path: `${path}.tolerance`, message: `Found ${tolerance}. A case may only tighten the rule, which allows ${Number(largest.toPrecision(12))} here.` });
  }
  return faults;
}
