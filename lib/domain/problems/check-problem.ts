import type { FieldProblem } from '@/lib/errors';
import { compileExpressions } from '@/lib/numerics/expression/compile-expressions';
import { functionNames } from '@/lib/numerics/expression/functions';
import type { ProblemDefinition } from './schema';
import { variablesOf } from './variables';

const meaningOfItsOwn: ReadonlySet<string> = new Set([...functionNames, 'd', 'pi', 'x', 'y', 'z', 't']);

/** What is wrong with a problem: every fault with the path of its member, those of an expression with the character. */
export function checkProblem(definition: ProblemDefinition): FieldProblem[] {
  return [...checkDomain(definition), ...checkFieldNames(definition), ...checkExpressions(definition)];
}

function checkDomain({ domain = {}, dimension }: ProblemDefinition): FieldProblem[] {
  const faults: FieldProblem[] = [];
  const axes = ['x', 'y', 'z'] as const;
  axes.forEach((axis, index) => {
    const interval = domain[axis];
    if (interval === undefined) return;
    const [from, to] = interval;
    if (index >= dimension) {
      faults.push({ path: `domain.${axis}`, message: `Found a range for ${axis}. A problem of dimension ${dimension} has ${axes.slice(0, dimension).join(', ')}.` });
    } else if (!(from < to)) {
      faults.push({ path: `domain.${axis}`, message: `Found ${from} to ${to}. Expected the first below the second.` });
    }
  });
  return faults;
}

function checkFieldNames({ exact = {} }: ProblemDefinition): FieldProblem[] {
  return Object.keys(exact).filter((name) => meaningOfItsOwn.has(name)).map((name) => ({
    path: `exact.${name}`, message: `“${name}” has a meaning of its own; give the field another name.`,
  }));
}

function checkExpressions(definition: ProblemDefinition): FieldProblem[] {
  const { constants, exact = {} } = definition;
  const compiled = compileExpressions({ constants, fields: exact, variables: variablesOf(definition) });
  if (compiled.ok) return [];
  return compiled.errors
    .filter(({ name }) => Object.hasOwn(constants, name) || !meaningOfItsOwn.has(name))
    .map(({ name, position, message }) => ({
      path: `${Object.hasOwn(constants, name) ? 'constants' : 'exact'}.${name}`, message: `Character ${position}: ${message}`,
    }));
}
