import type { Case } from '@/lib/domain/cases/schema';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createCodeContract, createReleaseContract, type Code, type Release } from '@/lib/domain/codes/schema';
import { createProblemContract, type Problem } from '@/lib/domain/problems/schema';
import { ok, type Who } from './api';

export const heatProblem = {
  name: 'Heat in a square', equation: 'heat', dimension: 2, constants: { k: 0.5 }, exact: { T: 'sin(pi*x)*sin(pi*y) + k*x' }, domain: { x: [0, 1], y: [0, 1] },
} as const;

export const orderCase = {
  name: 'Heat, second order', kind: 'order',
  fields: [{ field: 'T', norms: [{ norm: 'L2', formalOrder: 2 }, { norm: 'Linf', formalOrder: 2 }] }],
  gridPlan: [8, 16, 32, 64].map((n) => ({ label: `n${n}`, cellsPerDirection: n })),
} as const;

export interface Work { code: Code; release: Release; problem: Problem; case: Case }

/** A code with a release, and an order case of it on a problem with an exact solution. */
export async function makeWork(who: Who): Promise<Work> {
  const code = await ok(who, createCodeContract, { body: { name: 'Brack' } });
  const release = await ok(who, createReleaseContract, { params: { code: code.slug }, body: { version: '1.0.0' } });
  const problem = await ok(who, createProblemContract, { body: heatProblem });
  const made = await ok(who, createCaseContract, { body: { ...orderCase, code: code.slug, problem: problem.slug } });
  return { code, release, problem, case: made };
}
