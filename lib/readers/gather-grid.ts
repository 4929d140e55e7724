import type { ColumnEngine } from '../numerics/column-engine';
import { createAverageEvaluator } from '../numerics/expression/average-evaluator';
import { createBlockEvaluator } from '../numerics/expression/block-evaluator';
import { createMapGatherer } from '../numerics/maps/map-gatherer';
import { createMeshGatherer } from '../numerics/mesh/mesh-gatherer';
import { prepareRegions } from '../numerics/regions/region-gatherer';
import { createRigidGatherer } from '../numerics/rigid/rigid-gatherer';
import type { GridChecks } from './grid-checks';
import type { GridPart, GridTask } from './grid-task';
import { createRowProblems } from './row-problems';
import type { ColumnBatch } from './source';

/** Gathers some of the rows of a grid. */
export interface GridGatherer {
  add(batch: ColumnBatch): void;
  /** What they come to; what is wrong with them goes to the checks. `indices` are the columns of the file, as planned. */
  finish(indices: readonly number[]): GridPart;
}

/**
 * Prepares the exact solution once, for gatherers one after another: what batches come to, with their checks. Each holds
 * until the next one is asked for. Batches of columns in the memory of an engine are worked on there.
 */
export function prepareGathering(
  { plan, fields, exact, average, mesh, rigid, t: gridTime, bands, maps, mapRoom }: GridTask, engine: ColumnEngine | null = null,
): (checks: GridChecks) => GridGatherer {
  const evaluate = average ? null : createBlockEvaluator(exact, undefined, engine);
  const evaluateAverage = average ? createAverageEvaluator(exact, average.points, engine) : null;
  const startRegions = prepareRegions(fields, bands, engine);
  const gatherMaps = maps && mapRoom && createMapGatherer(maps, mapRoom);
  const mapped = (maps?.fields ?? []).map((field) => fields.indexOf(field));
  const survey = mesh ? createMeshGatherer([plan.x, plan.y, plan.z].filter((slot) => slot !== null).length) : null;
  const moments = rigid ? createRigidGatherer(rigid.origin) : null;
  const components = (rigid?.fields ?? []).map((field) => fields.indexOf(field));
  return (checks) => {
    const gatherer = startRegions();
    const rowProblems = createRowProblems();
    return {
      add({ rows, columns, lines }) {
        const pick = (slot: number | null) => (slot === null ? null : columns[slot] as Float64Array);
        const x = columns[plan.x] as Float64Array;
        const y = pick(plan.y);
        const z = pick(plan.z);
        const t = pick(plan.t);
        const at = { x, y: y ?? undefined, z: z ?? undefined, t: t ?? gridTime };
        const size = (axis: number) => (plan.extents.length > 0 ? columns[plan.extents[axis] as number] : average?.extents?.[axis]);
        const known = evaluateAverage?.(rows, at, { x: size(0), y: size(1), z: size(2) }) ?? evaluate?.(rows, at) ?? [];
        const before = gatherer.rows();
        checks.times.note(t, { rows, before, lines });
        const compared = plan.fields.map((slot, index) => ({ values: columns[slot] as Float64Array, exact: known[index] as Float64Array }));
        const axes = [x, y, z].filter((axis) => axis !== null);
        gatherer.add({ rows, x, y, z, weights: pick(plan.weight), fields: compared }, { distance: pick(plan.distance), flag: pick(plan.flag) });
        gatherMaps?.({ rows, axes, fields: mapped.map((index) => compared[index] as (typeof compared)[number]) });
        survey?.add({ rows, coordinates: axes, times: t, weights: mesh?.sizes ? pick(plan.weight) : null, extents: plan.extents.map((slot) => columns[slot] as Float64Array) });
        moments?.add({ rows, coordinates: axes, weights: pick(plan.weight), components: components.map((index) => compared[index] as (typeof compared)[number]) });
        rowProblems.note(gatherer.problems(), { before, lines, coordinates: { x, y, z } });
      },
      finish(indices) {
        for (const problem of gatherer.problems()) checks.values.add(rowProblems.explain(problem, plan, fields, indices), problem.count);
        return { norms: gatherer.parts(), mesh: survey?.takePart() ?? null, rigid: moments?.takePart() ?? null };
      },
    };
  };
}
