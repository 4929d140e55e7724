import type { Refinement } from '../studies/input';
import type { CaseDefinition } from './definition';

/** How a plan refines: in time where only steps are stated, in both where spacings and steps each come more than once, else in space. */
export function plannedRefinement(plan: CaseDefinition['gridPlan']): Refinement {
  const sizes = plan.map(({ h, cells, cellsPerDirection }) => (h ?? cells ?? cellsPerDirection) === undefined ? null : JSON.stringify([h, cells, cellsPerDirection]));
  const steps = plan.map(({ dt }) => dt);
  if (plan.length > 0 && sizes.every((size) => size === null) && steps.every((step) => step !== undefined)) return 'time';
  const isMatrix = steps.every((step) => step !== undefined) && new Set(steps).size > 1 && new Set(sizes).size > 1 && new Set(sizes).size * new Set(steps).size === plan.length;
  return isMatrix ? 'space-time' : 'space';
}
