import type { ColumnEngine } from '../column-engine';
import { createNormGatherer, createNormRooms, type NormBlock, type NormGatherer, type NormProblem } from '../norms/norm-gatherer';
import type { NormPart } from '../norms/norm-part';
import type { Bands } from './bands';
import { createRowClassifier, type RowClasses } from './classify-rows';
import { createRowPicker, mostPicked } from './pick-rows';

/** What tells where the rows of a block lie beside their coordinates; null where no band asks for it. */
export interface BoundaryColumns { distance: Float64Array | null; flag: Float64Array | null }

export interface RegionGatherer {
  add: (block: NormBlock, columns: BoundaryColumns) => void;
  rows: () => number;
  problems: () => readonly NormProblem[];
  /** What the rows so far come to, class by class; one part where no bands are asked for. */
  parts: () => NormPart[];
}

/** Of a class without rows. */
const empty: NormPart = { rows: 0, equalWeights: true, weights: { sum: 0, lost: 0 }, fields: [] };
/** Runs of one class that are this long on average are taken as they lie; shorter ones are copied together. */
const longRun = 256;

/**
 * Prepares gatherers, for one stretch of rows after another, that keep rows of different classes apart (createRowClassifier):
 * every row is summed once, and norms of a part of the domain come from its own rows alone, without a difference of sums.
 * Each gatherer holds until the next one is asked for.
 */
export function prepareRegions(fields: readonly string[], bands: Bands | undefined, engine: ColumnEngine | null = null): () => RegionGatherer {
  if (bands === undefined) {
    const rooms = createNormRooms(fields.length, engine);
    return () => plainGatherer(createNormGatherer(fields, rooms));
  }
  const classify = createRowClassifier(bands);
  const pick = createRowPicker(fields.length, engine);
  const kinds = Array.from({ length: 1 << bands.bands.length }, () => createNormRooms(fields.length, engine));
  return () => {
    const gatherers: (NormGatherer | undefined)[] = [];
    const problems = createProblems(fields);
    let rows = 0;
    const give = (kind: number, block: NormBlock) => (gatherers[kind] ??= createNormGatherer(fields, kinds[kind])).add(block);
    return {
      add(block, columns) {
        const axes = [block.x, block.y, block.z].filter((axis) => axis !== null);
        const classified = classify({ rows: block.rows, axes, weights: block.weights, ...columns });
        const found = classified.counts.flatMap((count, kind) => (count > 0 ? [kind] : []));
        if (found.length === 1) give(found[0] as number, block);
        else if (block.rows > longRun * classified.changes || block.rows > mostPicked) eachRun(classified, block, give);
        else for (const kind of found) give(kind, pick(block, classified, kind));
        if (gatherers.some((gatherer) => gatherer !== undefined && gatherer.problems().length > 0)) problems.look(block, rows);
        rows += block.rows;
      },
      rows: () => rows,
      problems: problems.list,
      parts: () => kinds.map((_, kind) => gatherers[kind]?.part() ?? empty),
    };
  };
}

function plainGatherer(gatherer: NormGatherer): RegionGatherer {
  return { add: (block) => gatherer.add(block), rows: () => gatherer.rows(), problems: () => gatherer.problems(), parts: () => [gatherer.part()] };
}

function eachRun({ classes }: RowClasses, block: NormBlock, give: (kind: number, block: NormBlock) => void): void {
  let from = 0;
  for (let i = 1; i <= block.rows; i += 1) {
    if (i < block.rows && classes[i] === classes[from]) continue;
    const cut = (column: Float64Array) => column.subarray(from, i);
    const cutNull = (column: Float64Array | null) => (column === null ? null : cut(column));
    give(classes[from] as number, {
      rows: i - from, x: cut(block.x), y: cutNull(block.y), z: cutNull(block.z), weights: cutNull(block.weights),
      fields: block.fields.map(({ values, exact }) => ({ values: cut(values), exact: cut(exact) })),
    });
    from = i;
  }
}

/** Rows of a class do not tell their place in the file: once something is wrong, blocks are looked through as they came. */
function createProblems(fields: readonly string[]): { look: (block: NormBlock, before: number) => void; list: () => NormProblem[] } {
  const problems = new Map<string, NormProblem>();
  return {
    look(block, before) {
      const looked = createNormGatherer(fields);
      looked.add(block);
      for (const problem of looked.problems()) {
        const key = `${problem.code} ${problem.field}`;
        const known = problems.get(key);
        if (known) known.count += problem.count;
        else problems.set(key, { ...problem, row: before + problem.row });
      }
    },
    list: () => [...problems.values()],
  };
}
