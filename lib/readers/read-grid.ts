import { createHash } from 'node:crypto';
import { createBlockEvaluator } from '../numerics/expression/block-evaluator';
import type { GridNorms } from '../numerics/norms/grid-norms';
import { createNormGatherer } from '../numerics/norms/norm-gatherer';
import { compileExact } from './compile-exact';
import type { GridReading } from './grid-reading';
import { planColumns } from './plan-columns';
import { readColumns } from './read-columns';
import { createReasonCollector } from './reason-collector';
import { createRowProblems } from './row-problems';
import type { ByteSource, ColumnBatch, ReadProgress } from './source';
import { createTimeCheck } from './time-check';

export interface GridReadResult {
  norms: GridNorms;
  /** Of the bytes as stored, in lower-case hexadecimal. */
  sha256: string;
  bytes: number;
}

export interface GridReadOptions {
  onProgress?: (progress: ReadProgress) => void;
  signal?: AbortSignal;
}

/**
 * Reads one grid in one pass: hash, decompression, columns, exact solution, norms. Throws RejectedFile with every reason
 * where the file cannot be taken. Expressions that do not compile and fields without a column are misuse and throw TypeError.
 */
export async function readGrid(source: ByteSource, reading: GridReading, options: GridReadOptions = {}): Promise<GridReadResult> {
  const plan = planColumns(reading);
  const evaluate = createBlockEvaluator(compileExact(reading));
  const fields = reading.fields.map(({ field }) => field);
  const gatherer = createNormGatherer(fields);
  const rowProblems = createRowProblems();
  const timeCheck = createTimeCheck(reading.t);
  const reasons = createReasonCollector();
  const hash = createHash('sha256');
  let bytes = 0;

  async function* hashed(): AsyncGenerator<Uint8Array> {
    for await (const chunk of source) {
      hash.update(chunk);
      bytes += chunk.length;
      yield chunk;
    }
  }

  const onBatch = ({ rows, columns, lines }: ColumnBatch) => {
    const pick = (slot: number | null) => (slot === null ? null : columns[slot] as Float64Array);
    const x = columns[plan.x] as Float64Array;
    const y = pick(plan.y);
    const z = pick(plan.z);
    const t = pick(plan.t);
    const exact = evaluate(rows, { x, y: y ?? undefined, z: z ?? undefined, t: t ?? reading.t });
    const before = gatherer.rows();
    timeCheck.note(t, { rows, before, lines });
    gatherer.add({
      rows, x, y, z, weights: pick(plan.weight),
      fields: plan.fields.map((slot, at) => ({ values: columns[slot] as Float64Array, exact: exact[at] as Float64Array })),
    });
    rowProblems.note(gatherer.problems(), { before, lines, coordinates: { x, y, z } });
  };

  const read = await readColumns(hashed(), { columns: plan.names, onBatch, reasons, ...options });
  const indices = read.columns.map(({ index }) => index);
  for (const problem of gatherer.problems()) reasons.add(rowProblems.explain(problem, plan, fields, indices), problem.count);
  const otherTime = timeCheck.problem(plan.t === null ? undefined : indices[plan.t]);
  if (otherTime) reasons.add(otherTime.found, otherTime.count);
  reasons.throwIfAny();
  const norms = gatherer.finish(plan.fields.map((slot) => read.columns[slot]?.significantDigits ?? null));
  if (norms === null) throw new Error('readGrid: rows without a problem have no norms');
  return { norms, sha256: hash.digest('hex'), bytes };
}
